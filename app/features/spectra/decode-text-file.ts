/** The text of a file: Unicode by its mark or by its bytes, else the Western set that old instruments write. */
export function decodeTextFile(bytes: Uint8Array): string {
  const marked = bytes[0] === 0xff && bytes[1] === 0xfe ? "utf-16le" : bytes[0] === 0xfe && bytes[1] === 0xff ? "utf-16be" : undefined;
  if (marked) return new TextDecoder(marked).decode(bytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}
