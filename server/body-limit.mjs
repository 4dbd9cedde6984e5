const mebibyte = 1024 ** 2;
const uploadBytes = 40 * mebibyte; // a picture from a good camera, or a handful of smaller ones
const otherBytes = 2 * mebibyte;
const lingerMs = 1_000;

/** Refuses a body that is too large, announced or not. Must stand right before what reads the body. */
export function bodyLimit(request, response, next) {
  const mostBytes = (request.headers["content-type"] ?? "").startsWith("multipart/form-data") ? uploadBytes : otherBytes;
  const refuse = () => {
    if (!response.headersSent) {
      response.status(413).type("text/plain").send(`This is larger than the ${mostBytes / mebibyte} MiB that can be sent at once. Nothing was stored.\n`);
    }
    // Closing at once, with bytes on their way, would reset the connection and could take the answer with it.
    setTimeout(() => request.destroy(), lingerMs).unref();
  };
  if (Number(request.headers["content-length"] ?? 0) > mostBytes) return refuse();
  if (request.headers["transfer-encoding"]) {
    let sizeBytes = 0;
    // In the same tick as the reader's own listener: the stream begins to flow only after both are there.
    request.on("data", (chunk) => {
      sizeBytes += chunk.length;
      if (sizeBytes <= mostBytes) return;
      request.pause();
      refuse();
    });
  }
  next();
}
