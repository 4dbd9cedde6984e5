import { execFile } from "node:child_process";
import { mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import jsQR from "jsqr";
import sharp from "sharp";

/** What a camera reads on the first page of a PDF: drawn by poppler at 150 dpi, as printed paper would be scanned. */
export async function readQr(pdf: Buffer): Promise<string | null> {
  const folder = await mkdtemp(path.join(tmpdir(), "isogyre-page-"));
  try {
    await writeFile(path.join(folder, "report.pdf"), pdf);
    await promisify(execFile)("pdftoppm", ["-r", "150", "-f", "1", "-l", "1", "-png", "-singlefile", path.join(folder, "report.pdf"), path.join(folder, "page")]);
    const { data, info } = await sharp(await readFile(path.join(folder, "page.png"))).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
    return jsQR(new Uint8ClampedArray(data), info.width, info.height)?.data ?? null;
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
