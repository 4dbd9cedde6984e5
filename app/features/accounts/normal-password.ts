/** One form for what keyboards write in several (é as one sign or two), so that a password works on all of them. */
export function normalPassword(password: string): string {
  return password.normalize("NFKC");
}
