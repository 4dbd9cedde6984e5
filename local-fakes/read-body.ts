import type { IncomingMessage } from "node:http";

const mostBytes = 64 * 1024 ** 2;

export async function readBody(request: IncomingMessage): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let sizeBytes = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    sizeBytes += chunk.length;
    if (sizeBytes > mostBytes) throw new Error("the body is larger than 64 MiB");
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}
