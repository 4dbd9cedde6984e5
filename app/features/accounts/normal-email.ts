/** Addresses are compared without regard to case; ours are ASCII, so no two spellings meet by the server's collation. */
export function normalEmail(email: string): string {
  return email.trim().toLowerCase();
}
