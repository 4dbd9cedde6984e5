/** The body as text, or undefined when it is longer than `mostBytes`: no more than that is ever held. */
export async function readTextUpTo(request: Request, mostBytes: number): Promise<string | undefined> {
  if (Number(request.headers.get("content-length") ?? 0) > mostBytes) return undefined;
  if (!request.body) return "";
  const reader = request.body.getReader();
  const chunks: Uint8Array[] = [];
  let size = 0;
  for (let read = await reader.read(); !read.done; read = await reader.read()) {
    size += read.value.byteLength;
    if (size > mostBytes) {
      void discardRest(reader);
      return undefined;
    }
    chunks.push(read.value);
  }
  return Buffer.concat(chunks).toString("utf8");
}

/** Cancelling would close the connection at once and take the refusal with it; the server in front ends what goes on for too long. */
async function discardRest(reader: ReadableStreamDefaultReader<Uint8Array>): Promise<void> {
  try {
    while (!(await reader.read()).done);
  } catch {
    // The sender has gone, which is what was hoped for.
  }
}
