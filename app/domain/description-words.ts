/** Neutral words for a stone's appearance (wording.md §§3–5): offered while typing, never forced, no trade names. */
export const shapeWords = [
  "round", "oval", "cushion", "square", "rectangle", "octagon", "pear", "marquise", "heart", "triangle", "kite", "trapeze", "half-moon", "hexagon", "shield",
  "straight baguette", "tapered baguette", "briolette", "drop", "bead", "freeform", "crystal", "carved",
] as const;
export const cutWords = [
  "brilliant", "step", "mixed", "modified brilliant", "rose", "table cut", "single cut", "old mine type", "old European type", "French", "fancy faceted", "high cabochon", "medium cabochon",
  "low cabochon", "double cabochon", "flat slab", "tumbled", "cameo", "intaglio", "engraved", "drilled", "rough",
] as const;
export const transparencyWords = ["transparent", "semi-transparent", "translucent", "semi-translucent", "opaque"] as const;
export const phenomenonWords = [
  "none", "asterism, 6 rays", "asterism, 4 rays", "asterism, 12 rays", "chatoyancy", "adularescence", "labradorescence", "play-of-colour", "iridescence", "aventurescence", "colour change", "orient",
] as const;
export const lightWords = ["daylight lamp, 6500 K", "daylight, overcast", "incandescent, 2850 K", "LED, 5000 K"] as const;
