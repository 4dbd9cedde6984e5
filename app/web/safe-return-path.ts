/** A path of this site to go on to; anything that could leave it becomes the fallback. */
export function safeReturnPath(path: unknown, fallback: string): string {
  return typeof path === "string" && /^\/(?![\\/])[^\s\\]*$/.test(path) ? path : fallback;
}
