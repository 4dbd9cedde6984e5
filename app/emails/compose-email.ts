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

/** One letter in HTML and in text that say the same. All values are escaped here and nowhere else; a subject is one line. */
export function composeEmail({ subject, from, heading, greetingName, paragraphs, facts = [], button, footnotes = [] }: Letter): Email {
  const name = oneLine(greetingName);
  const p = (text: string) => `<p style="margin:0 0 14px">${escapeHtml(text)}</p>`;
  const rows = facts.map(
    ([label, value]) =>
      `<tr><td style="padding:5px 16px 5px 0;color:#5d5666;vertical-align:top">${escapeHtml(label)}</td><td style="padding:5px 0;font-family:'IBM Plex Mono',Menlo,Consolas,monospace">${escapeHtml(value)}</td></tr>`,
  );
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light dark"><meta name="supported-color-schemes" content="light dark"><title>${escapeHtml(oneLine(subject))}</title><style>@media (prefers-color-scheme:dark){.b{background:#131016!important}.s{background:#1a161f!important;color:#eadfd0!important;border-color:#3d3545!important}.s td,.s p.n{color:#b3a799!important}.h{color:#eadfd0!important}.a{background:#c58bd6!important;color:#1a161f!important}}</style></head><body class="b" style="margin:0;padding:0;background:#faf8f3"><table role="presentation" width="100%" cellpadding="0" cellspacing="0" class="b" style="background:#faf8f3"><tr><td align="center" style="padding:24px 12px"><table role="presentation" width="600" cellpadding="0" cellspacing="0" style="max-width:600px;width:100%"><tr><td style="height:4px;line-height:4px;font-size:0;background:#6a1b7d;background-image:${interferenceGradient({ stepNm: 100 })}">&nbsp;</td></tr><tr><td class="s" style="background:#fffefb;color:#211c29;border:1px solid #e6e0d4;border-top:0;border-radius:0 0 10px 10px;padding:28px 30px;font:15px/1.55 'IBM Plex Sans',Helvetica,Arial,sans-serif"><p class="n" style="margin:0 0 4px;color:#5d5666;font-size:13px">${escapeHtml(from)}</p><h1 class="h" style="margin:0 0 18px;font:500 23px/1.3 Lora,Georgia,serif;color:#211c29">${escapeHtml(heading)}</h1>${p(`Dear ${name},`)}${paragraphs.map(p).join("")}${rows.length ? `<table role="presentation" cellpadding="0" cellspacing="0" style="margin:0 0 18px;font-size:14px">${rows.join("")}</table>` : ""}${
    button
      ? `<p style="margin:0 0 18px"><a class="a" href="${escapeHtml(button.url)}" style="display:inline-block;background:#6a1b7d;color:#ffffff;text-decoration:none;font-weight:600;padding:11px 20px;border-radius:6px">${escapeHtml(button.label)}</a></p><p class="n" style="margin:0 0 14px;color:#5d5666;font-size:13px">If the button does not work, open this address:<br><a href="${escapeHtml(button.url)}" style="color:inherit;word-break:break-all">${escapeHtml(button.url)}</a></p>`
      : ""
  }${footnotes.map((note) => `<p class="n" style="margin:14px 0 0;color:#5d5666;font-size:13px">${escapeHtml(note)}</p>`).join("")}</td></tr></table></td></tr></table></body></html>`;
  const text = [
    from,
    "",
    heading,
    "",
    `Dear ${name},`,
    "",
    ...paragraphs.flatMap((paragraph) => [paragraph, ""]),
    ...facts.map(([label, value]) => `${label}: ${value}`),
    ...(facts.length ? [""] : []),
    ...(button ? [`${button.label}:`, button.url, ""] : []),
    ...footnotes,
  ].join("\n");
  return { subject: oneLine(subject).slice(0, 200), html, text };
}

/** A line break in a subject would start a header of the sender's choice. */
function oneLine(text: string): string {
   
  return text.replace(/[\u0000-\u001f\u007f\u2028\u2029]+/g, " ").trim();
}
