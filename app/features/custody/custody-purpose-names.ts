export const custodyPurposeNames = {
  received: "Received",
  toBench: "To the bench",
  toSafe: "To the safe",
  toOutside: "Sent to an outside laboratory",
  fromOutside: "Back from an outside laboratory",
  release: "Released",
} as const;
