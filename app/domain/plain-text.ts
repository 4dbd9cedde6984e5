/** Text as it is kept: one kind of line end, composed letters, no blank around it. */
export function plainText(text: string): string {
  return text.replace(/\r\n?/g, "\n").normalize("NFC").trim();
}
