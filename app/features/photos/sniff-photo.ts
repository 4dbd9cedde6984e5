import type { PhotoType } from "./photo-limits.ts";

const typeOfExtension: Readonly<Record<string, PhotoType>> = { jpg: "image/jpeg", jpeg: "image/jpeg", png: "image/png", webp: "image/webp" };

/** What the bytes themselves say they are; the sender's word for it counts for nothing. */
export function sniffPhoto(bytes: Uint8Array): PhotoType | undefined {
  const starts = (at: number, ...expected: number[]) => expected.every((byte, index) => bytes[at + index] === byte);
  if (starts(0, 0xff, 0xd8, 0xff)) return "image/jpeg";
  if (starts(0, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) return "image/png";
  if (starts(0, 0x52, 0x49, 0x46, 0x46) && starts(8, 0x57, 0x45, 0x42, 0x50)) return "image/webp";
  return undefined;
}

/** What a file's name claims, where it claims one of the kinds that are taken. */
export function claimedType(fileName: string): PhotoType | undefined {
  return typeOfExtension[/\.([a-z]+)$/i.exec(fileName)?.[1]?.toLowerCase() ?? ""];
}
