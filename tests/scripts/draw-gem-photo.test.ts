import sharp from "sharp";
import { expect, test } from "vitest";
import { drawGemPhoto } from "../../scripts/draw-gem-photo.ts";

const middleOf = async (photo: Buffer) => {
  const { width, height } = await sharp(photo).metadata();
  const { channels } = await sharp(photo).extract({ left: Math.round(width * 0.42), top: Math.round(height * 0.42), width: Math.round(width * 0.16), height: Math.round(height * 0.16) }).stats();
  return channels.map(({ mean }) => mean);
};

test("the same stone is drawn the same twice, another seed differently", async () => {
  const options = { outline: "oval", hue: "purplish red", seed: 4, widthPx: 160 } as const;
  const photo = await drawGemPhoto(options);
  expect(await drawGemPhoto(options)).toEqual(photo);
  expect(await drawGemPhoto({ ...options, seed: 5 })).not.toEqual(photo);
  expect(await sharp(photo).metadata()).toMatchObject({ format: "jpeg", width: 160, height: 120 });
});

test.each([
  ["red", 0],
  ["green", 1],
  ["blue", 2],
] as const)("a %s stone is %s where one looks into it", async (hue, strongest) => {
  const means = await middleOf(await drawGemPhoto({ outline: "cushion", hue, seed: 1, widthPx: 160 }));
  expect(means.indexOf(Math.max(...means))).toBe(strongest);
});
