export const largestPhotoBytes = 15 * 1024 * 1024;
export const photoTypes = ["image/jpeg", "image/png", "image/webp"] as const;
export type PhotoType = (typeof photoTypes)[number];
