/** SHA-256 of a file, lower-case hex. Runs in the browser: the file goes nowhere. */
export async function fingerprintOf(file: Blob): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", await file.arrayBuffer());
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, "0")).join("");
}
