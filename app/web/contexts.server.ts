import { createContext } from "react-router";
import type { AppContext } from "#app/features/app-context.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import type { SignedIn } from "#app/features/accounts/find-signed-in.server.ts";

/** Set by the root's middleware on every request. */
export const appContext = createContext<AppContext>();
/** Set by the middleware of pages for signed-in people. */
export const signedInContext = createContext<SignedIn>();
/** Set by the middleware of one laboratory's pages: who acts, where, when and through what. */
export const labContext = createContext<LabContext>();
