/** An error over HTTP by RFC 9457. */
export function problem({ status, title, detail, errors }: { status: number; title: string; detail: string; errors?: ReadonlyArray<{ path: string; message: string }> }): Response {
  return new Response(JSON.stringify({ type: "about:blank", title, status, detail, ...(errors && { errors }) }), {
    status,
    headers: { "Content-Type": "application/problem+json", "Cache-Control": "no-store" },
  });
}
