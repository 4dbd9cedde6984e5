import { mkdirSync, writeFileSync } from "node:fs";
import { drawGemPhoto } from "../draw-gem-photo.ts";
import { photoFile } from "./photo-file.ts";
import { marramStories, tarnStories } from "./stories.ts";

// Drawing traces light through each stone and takes seconds: done when the stories change, the pictures are committed.
mkdirSync("fixtures/demo-photos", { recursive: true });
for (const [index, { photo }] of [...marramStories, ...tarnStories].entries()) {
  if (photo) writeFileSync(photoFile(photo), await drawGemPhoto({ ...photo, seed: 41 + index, widthPx: 800 }));
}
