// Paths carry secrets: a register code, the token of an invitation, of a password link, of a payment page.
const afterThese = new Set(["v", "pay", "join", "invitation", "invitations", "reset", "confirm", "terms", "consent"]);
const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** The path as the log may keep it: no query, and "…" for what follows a word above or looks like a token. */
export function redactPath(url) {
  const parts = url.split(/[?#]/, 1)[0].split("/");
  return parts.map((part, index) => (part !== "" && (afterThese.has(parts[index - 1]) || isTokenLike(part)) ? "…" : part)).join("/");
}

/** Long, with digits or capitals in it: a slug of plain words is not, nor is a row's id. */
function isTokenLike(part) {
  return part.length >= 16 && /[A-Z0-9%]/.test(part) && !uuid.test(part);
}
