import mono400 from "@fontsource/ibm-plex-mono/files/ibm-plex-mono-latin-400-normal.woff2?url";
import sans400 from "@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?url";
import sans600 from "@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-600-normal.woff2?url";
import serif500 from "@fontsource/lora/files/lora-latin-500-normal.woff2?url";

/** The faces that every page shows above the fold, for the root's `links`: they arrive with the style sheet, not after it. */
export const documentFonts = [sans400, sans600, serif500, mono400].map((href) => ({
  rel: "preload",
  as: "font" as const,
  type: "font/woff2",
  href,
  crossOrigin: "anonymous" as const,
}));
