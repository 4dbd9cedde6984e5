/** The store of what waits on this device. It comes after the page works; once it came, it is there without the line as well. */
export const loadOutbox = () => import("./outbox-parts.ts");
