import { createContext } from "react-router";

/** The nonce of this response's content-security policy; empty where no server in front sets one. */
export const nonceContext = createContext<string>("");
