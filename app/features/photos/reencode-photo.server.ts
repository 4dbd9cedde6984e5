import sharp from "sharp";
import { AppError } from "#app/domain/app-error.ts";
import { largestPhotoBytes, type PhotoType } from "./photo-limits.ts";
import { claimedType, sniffPhoto } from "./sniff-photo.ts";

const largestPixels = 50_000_000;
const longestSidePx = 2400;
const thumbnailSidePx = 256;
const smallestSidePx = 16;
const decodeTimeoutS = 20;

const kindNames: Readonly<Record<PhotoType, string>> = { "image/jpeg": "JPEG", "image/png": "PNG", "image/webp": "WebP" };

export type ReencodedPhoto = { bytes: Buffer; thumbnail: Buffer; widthPx: number; heightPx: number };

/**
 * Decodes a picture and writes it anew: upright, in sRGB, at most 2400 px, without any metadata (camera, place, time),
 * so that nothing of the file that came reaches anybody.
 * @throws AppError invalid_input with a sentence for the field `photo`
 */
export async function reencodePhoto({ bytes, fileName }: { bytes: Buffer; fileName: string }): Promise<ReencodedPhoto> {
  if (bytes.length === 0) throw refused("This file is empty.");
  if (bytes.length > largestPhotoBytes) throw refused(`This file has ${Math.ceil(bytes.length / 1024 / 1024)} MB; photographs of up to 15 MB are taken.`);
  const type = sniffPhoto(bytes);
  if (!type) throw refused("This is not a JPEG, PNG or WebP picture. Save it as one of these and send it again.");
  const claimed = claimedType(fileName);
  if (claimed && claimed !== type) throw refused(`The name says ${kindNames[claimed]}, but the file is ${kindNames[type]}. Give it its right name, or save it anew.`);
  try {
    const upright = sharp(bytes, { limitInputPixels: largestPixels, failOn: "error", animated: false }).timeout({ seconds: decodeTimeoutS }).autoOrient();
    const full = await upright
      .clone()
      .resize({ width: longestSidePx, height: longestSidePx, fit: "inside", withoutEnlargement: true })
      .flatten({ background: "#ffffff" })
      .toColourspace("srgb")
      .jpeg({ quality: 85 })
      .toBuffer({ resolveWithObject: true });
    if (Math.min(full.info.width, full.info.height) < smallestSidePx) throw refused("This picture is too small to show anything.");
    const thumbnail = await sharp(full.data).resize({ width: thumbnailSidePx, height: thumbnailSidePx, fit: "cover" }).jpeg({ quality: 80 }).toBuffer();
    return { bytes: full.data, thumbnail, widthPx: full.info.width, heightPx: full.info.height };
  } catch (error) {
    if (error instanceof AppError) throw error;
    if (error instanceof Error && /pixel limit/i.test(error.message)) throw refused("This picture has more than 50 million pixels. Save it smaller and send it again.", error);
    throw refused("This picture is damaged or not complete. Send it again from the camera.", error);
  }
}

function refused(message: string, cause?: unknown): AppError {
  return new AppError("invalid_input", message, { cause, fieldErrors: { photo: [message] } });
}
