import { eq } from "drizzle-orm";
import sharp from "sharp";
import { beforeAll, expect, test } from "vitest";
import { attachments, stones } from "#app/db/schema/index.ts";
import { addPhoto } from "#app/features/photos/add-photo.server.ts";
import { getPhoto } from "#app/features/photos/get-photo.server.ts";
import { removePhoto } from "#app/features/photos/remove-photo.server.ts";
import type { LabContext } from "#app/features/lab-context.ts";
import { aLab, aMember } from "../../setup/factories.ts";
import { testServices } from "../../setup/test-services.ts";
import { aTakenInItem } from "../../setup/take-in-factory.ts";

let jpeg: Buffer;
let png: Buffer;
let webp: Buffer;
beforeAll(async () => {
  const picture = sharp({ create: { width: 300, height: 200, channels: 3, background: "#b3154a" } });
  jpeg = await picture.clone().jpeg().toBuffer();
  png = await picture.clone().png().toBuffer();
  webp = await picture.clone().webp().toBuffer();
});

async function aPhotoLab() {
  const services = testServices();
  const ctx = await aLab({ services });
  const { itemId } = await aTakenInItem(ctx, { stoneCount: 2 });
  const add = (bytes: Buffer, fileName = "photo.jpg", sourceKey = "upload-1") => addPhoto(ctx, { itemId, bytes, fileName, sourceKey });
  return { ctx, itemId, add, files: services.files };
}
const refusedWith = (part: string) => ({ code: "invalid_input", fieldErrors: { photo: [expect.stringContaining(part)] } });

test.each(["jpg", "png", "webp"])("a %s picture is kept re-encoded as JPEG, with a thumbnail, and becomes the stones' picture", async (kind) => {
  const { ctx, itemId, add } = await aPhotoLab();
  const id = await add({ jpg: jpeg, png, webp }[kind as "jpg"], `photo.${kind}`);
  const full = await getPhoto(ctx, id, "full");
  expect(await sharp(full.bytes).metadata()).toMatchObject({ format: "jpeg", width: 300, height: 200, space: "srgb" });
  expect(await sharp((await getPhoto(ctx, id, "thumbnail")).bytes).metadata()).toMatchObject({ format: "jpeg", width: 256, height: 256 });
  expect((await ctx.db.select({ photoId: stones.photoId }).from(stones).where(eq(stones.itemId, itemId))).map((row) => row.photoId)).toEqual([id, id]);
});

test("the place and the camera of a photograph are gone, and it stands upright", async () => {
  const { ctx, add } = await aPhotoLab();
  const withPlace = await sharp({ create: { width: 300, height: 200, channels: 3, background: "#1f4fa3" } })
    .withExif({ IFD0: { Make: "SecretCamera", Copyright: "Somebody" }, IFD3: { GPSLatitudeRef: "N", GPSLatitude: "51/1 30/1 3230/100", GPSLongitudeRef: "W", GPSLongitude: "0/1 7/1 4366/100" } })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer();
  expect((await sharp(withPlace).metadata()).exif).toBeDefined();
  const { bytes } = await getPhoto(ctx, await add(withPlace), "full");
  const metadata = await sharp(bytes).metadata();
  expect(metadata).toMatchObject({ width: 200, height: 300 });
  for (const part of [metadata.exif, metadata.iptc, metadata.xmp, metadata.icc, metadata.orientation]) expect(part).toBeUndefined();
  expect(bytes.includes("SecretCamera")).toBe(false);
});

test("a large picture is made smaller, and a transparent one gets a white ground", async () => {
  const { ctx, add } = await aPhotoLab();
  const large = await sharp({ create: { width: 5000, height: 2500, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } }).png().toBuffer();
  const { bytes } = await getPhoto(ctx, await add(large, "photo.png"), "full");
  expect(await sharp(bytes).metadata()).toMatchObject({ width: 2400, height: 1200 });
  expect([...(await sharp(bytes).extract({ left: 0, top: 0, width: 1, height: 1 }).raw().toBuffer())]).toEqual([255, 255, 255]);
});

test("what is no picture, no whole picture, or another kind than it says is refused with a reason, and nothing is kept", async () => {
  const { ctx, itemId, add, files } = await aPhotoLab();
  const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>');
  const heic = Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from("ftypheic"), Buffer.alloc(200)]);
  await expect(add(Buffer.alloc(0))).rejects.toMatchObject(refusedWith("empty"));
  await expect(add(Buffer.alloc(15 * 1024 * 1024 + 1, 0xff))).rejects.toMatchObject(refusedWith("up to 15 MB"));
  await expect(add(Buffer.from("<html>not a picture</html>"))).rejects.toMatchObject(refusedWith("not a JPEG, PNG or WebP"));
  await expect(add(svg, "photo.svg")).rejects.toMatchObject(refusedWith("not a JPEG, PNG or WebP"));
  await expect(add(heic, "photo.heic")).rejects.toMatchObject(refusedWith("not a JPEG, PNG or WebP"));
  await expect(add(Buffer.from("GIF89a----------"), "photo.gif")).rejects.toMatchObject(refusedWith("not a JPEG, PNG or WebP"));
  await expect(add(png, "photo.jpg")).rejects.toMatchObject(refusedWith("The name says JPEG, but the file is PNG"));
  await expect(add(jpeg.subarray(0, jpeg.length / 2))).rejects.toMatchObject(refusedWith("damaged or not complete"));
  await expect(add(Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), Buffer.alloc(500, 7)]))).rejects.toMatchObject(refusedWith("damaged or not complete"));
  expect(files.size).toBe(0);
  expect(await ctx.db.select({ id: attachments.id }).from(attachments).where(eq(attachments.itemId, itemId))).toEqual([]);
});

test("a picture that claims more pixels than a camera has is refused before it is decoded", async () => {
  const { add } = await aPhotoLab();
  const huge = Buffer.from(png);
  huge.writeUInt32BE(65_535, 16);
  huge.writeUInt32BE(65_535, 20);
  const startedAt = performance.now();
  await expect(add(huge, "photo.png")).rejects.toMatchObject({ code: "invalid_input" });
  expect(performance.now() - startedAt).toBeLessThan(3_000);
  const wide = await sharp({ create: { width: 8000, height: 6300, channels: 3, background: "#000000" } }).png({ compressionLevel: 1 }).toBuffer();
  await expect(add(wide, "photo.png")).rejects.toMatchObject(refusedWith("50 million pixels"));
});

test("the same upload told twice makes one photograph and leaves one file", async () => {
  const { ctx, itemId, add, files } = await aPhotoLab();
  const [first, second] = await Promise.all([add(jpeg), add(jpeg)]);
  expect(second).toBe(first);
  expect(await add(jpeg)).toBe(first);
  expect(files.size).toBe(1);
  expect(await ctx.db.select({ id: attachments.id }).from(attachments).where(eq(attachments.itemId, itemId))).toHaveLength(1);
});

test("a file is taken back when the database does not keep it", async () => {
  const { ctx, itemId, files } = await aPhotoLab();
  await expect(addPhoto(ctx, { itemId, bytes: jpeg, fileName: "a.jpg", sourceKey: "x".repeat(200) })).rejects.toThrow();
  expect(files.size).toBe(0);
});

test("another laboratory neither adds to our items nor sees our photographs", async () => {
  const { ctx, itemId, add } = await aPhotoLab();
  const theirs = await aLab();
  const id = await add(jpeg);
  await expect(addPhoto(theirs, { itemId, bytes: jpeg, fileName: "a.jpg", sourceKey: "k" })).rejects.toMatchObject({ code: "not_found" });
  await expect(getPhoto(theirs, id, "full")).rejects.toMatchObject({ code: "not_found" });
  await expect(getPhoto(theirs, id, "thumbnail")).rejects.toMatchObject({ code: "not_found" });
  await expect(removePhoto(theirs, id)).rejects.toMatchObject({ code: "not_found" });
  const appraiser: LabContext = await aMember(ctx, ["appraiser"]);
  await expect(addPhoto(appraiser, { itemId, bytes: jpeg, fileName: "a.jpg", sourceKey: "k" })).rejects.toMatchObject({ code: "forbidden" });
});

test("a photograph is taken away while nothing was examined, and stays afterwards", async () => {
  const { ctx, itemId, add, files } = await aPhotoLab();
  const first = await add(jpeg);
  const second = await add(png, "b.png", "upload-2");
  await removePhoto(ctx, first);
  expect(files.size).toBe(1);
  expect((await ctx.db.select({ photoId: stones.photoId }).from(stones).where(eq(stones.itemId, itemId)))[0]!.photoId).toBe(second);
  await ctx.db.update(stones).set({ examinationState: "examining" }).where(eq(stones.itemId, itemId));
  await expect(removePhoto(ctx, second)).rejects.toMatchObject({ code: "conflict" });
});
