import { interferenceGradient } from "#app/domain/interference-colour.ts";
import { escapeHtml } from "./escape-html.ts";

export type Email = Readonly<{ subject: string; html: string; text: string }>;

type Letter = {
  subject: string;
  /** Who writes: the laboratory's name, or ours for accounts. */
  from: string;
  heading: string;
  greetingName: string;
  paragraphs: readonly string[];
  facts?: ReadonlyArray<readonly [name: string, value: string]>;
  button?: { label: string; url: string };
  footnotes?: readonly string[];
};

/** So many characters of one text at most: a letter stays below the 100 kB at which mail programs cut it. */
const mostCharacters = 600;
const sans = "'IBM Plex Sans',Helvetica,Arial,sans-serif";
const mono = "'IBM Plex Mono',Menlo,Consolas,monospace";
const serif = "Lora,Georgia,serif";
/** Mail programs that paint a dark room keep our own colours for it; the others never see these rules. */
const darkRoom =
  "@media (prefers-color-scheme:dark){.b{background:#131016!important}.s{background:#1a161f!important;color:#eadfd0!important;border-color:#3d3545!important}.h,.v{color:#eadfd0!important}.n{color:#b3a799!important}.a{background:#c58bd6!important;color:#1a161f!important}}";

/**
 * One letter in HTML and in text that say the same. Every value is brought to one line, shortened and escaped here and
 * nowhere else: names come from strangers.
 */
export function composeEmail(letter: Letter): Email {
  const subject = oneLine(letter.subject, 200);
  const from = oneLine(letter.from);
  const heading = oneLine(letter.heading);
  const greeting = greetingTo(letter.greetingName);
  const paragraphs = letter.paragraphs.map((text) => oneLine(text));
  const facts = (letter.facts ?? []).map(([label, value]) => [oneLine(label), oneLine(value)] as const);
  const footnotes = (letter.footnotes ?? []).map((text) => oneLine(text));
  const button = letter.button && { label: oneLine(letter.button.label), url: webAddress(letter.button.url) };

  const note = "color:#5d5666;font-size:13px";
  const body = [
    `<p class="n" style="margin:0 0 4px;${note}">${escapeHtml(from)}</p>`,
    `<h1 class="h" style="margin:0 0 18px;font:500 23px/1.3 ${serif};color:#211c29">${escapeHtml(heading)}</h1>`,
    ...[greeting, ...paragraphs].map((text) => `<p style="margin:0 0 14px">${escapeHtml(text)}</p>`),
    facts.length > 0 ? `<table role="presentation" cellpadding="0" cellspacing="0" style="margin:0 0 18px;font-size:14px">${facts.map(factRow).join("")}</table>` : "",
    button
      ? `<p style="margin:0 0 18px"><a class="a" href="${escapeHtml(button.url)}" style="display:inline-block;background:#6a1b7d;color:#ffffff;text-decoration:none;font-weight:600;padding:11px 20px;border-radius:6px">${escapeHtml(button.label)}</a></p>` +
        `<p class="n" style="margin:0 0 14px;${note}">If the button does not work, open this address:<br><a href="${escapeHtml(button.url)}" style="color:inherit;word-break:break-all">${escapeHtml(button.url)}</a></p>`
      : "",
    ...footnotes.map((text) => `<p class="n" style="margin:14px 0 0;${note}">${escapeHtml(text)}</p>`),
  ].join("");
  const text = [
    from,
    "",
    heading,
    "",
    greeting,
    "",
    ...paragraphs.flatMap((paragraph) => [paragraph, ""]),
    ...facts.map(([label, value]) => `${label}: ${value}`),
    ...(facts.length > 0 ? [""] : []),
    ...(button ? [`${button.label}:`, button.url, ""] : []),
    ...footnotes,
  ].join("\n");
  return { subject, html: frame({ title: subject, body }), text };
}

function factRow([label, value]: readonly [string, string]): string {
  return `<tr><td class="n" style="padding:5px 16px 5px 0;color:#5d5666;vertical-align:top">${escapeHtml(label)}</td><td class="v" style="padding:5px 0;font-family:${mono};word-break:break-word">${escapeHtml(value)}</td></tr>`;
}

/** The sheet: 600 px, tables and inline styles because mail programs know little else, no picture from outside. */
function frame({ title, body }: { title: string; body: string }): string {
  return [
    `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light dark"><meta name="supported-color-schemes" content="light dark"><title>${escapeHtml(title)}</title><style>${darkRoom}</style></head>`,
    `<body class="b" style="margin:0;padding:0;background:#faf8f3"><table role="presentation" width="100%" cellpadding="0" cellspacing="0" class="b" style="background:#faf8f3"><tr><td align="center" style="padding:24px 12px">`,
    `<table role="presentation" width="600" cellpadding="0" cellspacing="0" style="max-width:600px;width:100%">`,
    `<tr><td style="height:4px;line-height:4px;font-size:0;background:#6a1b7d;background-image:${interferenceGradient({ stepNm: 100 })}">&nbsp;</td></tr>`,
    `<tr><td class="s" style="background:#fffefb;color:#211c29;border:1px solid #e6e0d4;border-top:0;border-radius:0 0 10px 10px;padding:28px 30px;font:15px/1.55 ${sans}">${body}</td></tr>`,
    `</table></td></tr></table></body></html>`,
  ].join("");
}

/** Mail programs turn an address in a text into a link: one typed as a name would make our letter somebody's advertisement. */
function greetingTo(typedName: string): string {
  const name = oneLine(typedName, 80);
  const looksLikeAnAddress = /[/@:]|[^\s.]\.[^\s.]{2,}/.test(name);
  return name === "" || looksLikeAnAddress ? "Good day," : `Dear ${name},`;
}

function webAddress(url: string): string {
  const { protocol, href } = new URL(url);
  if (protocol !== "https:" && protocol !== "http:") throw new Error(`A letter links to web pages only, not to ${protocol}`);
  return href;
}

/** A line break in a subject would start a header of the sender's choice; marks that turn the reading direction hide endings. */
function oneLine(text: string, most = mostCharacters): string {
  const line = text.replace(/[\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]/g, "").replace(/[\p{Cc}\u2028\u2029 ]+/gu, " ").trim();
  const characters = [...line];
  return characters.length <= most ? line : `${characters.slice(0, most - 1).join("")}…`;
}
