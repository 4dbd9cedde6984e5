import loraUrl from "@fontsource/lora/files/lora-latin-500-normal.woff2?url";
import plexMonoUrl from "@fontsource/ibm-plex-mono/files/ibm-plex-mono-latin-400-normal.woff2?url";
import plexUrl from "@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?url";
import plexBoldUrl from "@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-600-normal.woff2?url";
import { registerStyle } from "./register-style.ts";

/** A whole HTML document without any script, so that it opens anywhere at once. */
export function RegisterDocument({ title, children, isIndexed = false }: { title: string; children: React.ReactNode; isIndexed?: boolean }) {
  const fonts = [
    ["Lora", 500, loraUrl],
    ["IBM Plex Sans", 400, plexUrl],
    ["IBM Plex Sans", 600, plexBoldUrl],
    ["IBM Plex Mono", 400, plexMonoUrl],
  ] as const;
  const faces = fonts.map(([family, weight, url]) => `@font-face{font-family:"${family}";font-weight:${weight};font-display:swap;src:url(${url}) format("woff2")}`);
  return (
    <html lang="en">
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light dark" />
        {isIndexed ? null : <meta name="robots" content="noindex" />}
        <title>{title}</title>
        <link rel="icon" href="/favicon.svg" type="image/svg+xml" />
        <style dangerouslySetInnerHTML={{ __html: faces.join("") + registerStyle }} />
      </head>
      <body>
        <div className="ramp" />
        {children}
      </body>
    </html>
  );
}
