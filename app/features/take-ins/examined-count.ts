import type { MountState } from "#app/domain/take-in.ts";

/** How many stones an item is examined as: each one that is counted, but a strand as one piece. */
export function examinedCount({ mount, stoneCount }: { mount: MountState; stoneCount: number }): number {
  return mount === "strung" ? 1 : stoneCount;
}
