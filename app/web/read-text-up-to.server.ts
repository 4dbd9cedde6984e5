/** The body as text, or undefined when it is longer than `mostBytes`: no more than that is ever held. */
export async function readTextUpTo(request: Request, mostBytes: number): Promise<string | undefined> {
  if (Number(request.headers.get("content-length") ?? 0) > mostBytes) return undefined;
  if (!request.body) return "";
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of request.body as unknown as AsyncIterable<Uint8Array>) {
    size += chunk.byteLength;
    if (size > mostBytes) return undefined;
    chunks.push(chunk);
  }
  return Buffer.concat(chunks).toString("utf8");
}
