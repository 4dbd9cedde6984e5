export const roles = ["owner", "gemmologist", "appraiser", "desk"] as const;
export type Role = (typeof roles)[number];

export const roleNames: Readonly<Record<Role, string>> = {
  owner: "Owner",
  gemmologist: "Gemmologist",
  appraiser: "Appraiser",
  desk: "Desk",
};
