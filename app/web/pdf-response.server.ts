/** A stored PDF, shown or saved under its number, never cached by anybody in between. */
export function pdfResponse({ pdf, fileName }: { pdf: Buffer; fileName: string }, { isFramed = false }: { /** One of our own pages shows it within. */ isFramed?: boolean } = {}): Response {
  return new Response(new Uint8Array(pdf), {
    headers: {
      "Content-Type": "application/pdf",
      "Content-Length": String(pdf.byteLength),
      "Content-Disposition": `inline; filename="${fileName.replace(/[^\w.-]/g, "_")}"`,
      "Cache-Control": "private, no-store",
      ...(isFramed ? { "X-Frame-Options": "SAMEORIGIN", "Content-Security-Policy": "default-src 'none'; object-src 'self'; style-src 'unsafe-inline'; frame-ancestors 'self'" } : {}),
    },
  });
}
