import { createContext } from "react-router";

/** Set by the server in front (it knows which proxies to trust); without one all askers share a rate limit. */
export const clientAddressContext = createContext<string>("unknown");
