import jsQR from "jsqr";
import sharp from "sharp";
import { expect, test } from "vitest";
import { qrPath } from "#app/reports/qr-path.ts";

test.each(["MQ-26-0417 · 1", "http://127.0.0.1:3000/v/7KQ4M2XD9TPA3HZW", "x".repeat(300)])("%s reads back from the drawn path", async (text) => {
  const { size, path } = qrPath(text);
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="-4 -4 ${size + 8} ${size + 8}" width="600" height="600"><rect x="-4" y="-4" width="100%" height="100%" fill="#fff"/><path d="${path}"/></svg>`;
  const { data, info } = await sharp(Buffer.from(svg)).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  expect(jsQR(new Uint8ClampedArray(data), info.width, info.height)?.data).toBe(text);
});

test("a text beyond what a QR code holds is refused", () => {
  expect(() => qrPath("x".repeat(3_000))).toThrow();
});
