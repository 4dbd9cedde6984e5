/** The look of the stand-ins' pages: the project's paper and ink, nothing loaded from anywhere. */
export function page({ title, note, body }: { title: string; note: string; body: string }): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(title)}</title>
<style>${style}</style>
</head>
<body>
<header><p role="note">${escapeHtml(note)}</p></header>
<main><h1>${escapeHtml(title)}</h1>${body}</main>
</body>
</html>`;
}

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

export function formatInstant(ms: number): string {
  return `${new Date(ms).toISOString().slice(0, 19).replace("T", " ")} UTC`;
}

const style = `
:root{--paper:#faf8f3;--sheet:#fffefb;--ink:#211c29;--ink2:#5d5666;--rule:#d5cdbd;--tint:#6a1b7d;--green:#1b6b4a;--red:#a62a3b;--straw:#fbf1d9}
@media (prefers-color-scheme:dark){:root{--paper:#131016;--sheet:#1a161f;--ink:#eadfd0;--ink2:#b3a799;--rule:#3d3545;--tint:#c58bd6;--green:#7cc7a0;--red:#ea8a8f;--straw:#2b2212}}
*{box-sizing:border-box}
body{margin:0;background:var(--paper);color:var(--ink);font:16px/1.5 Lora,"Source Serif 4","Iowan Old Style",Palatino,Georgia,serif}
header p{margin:0;padding:.6rem 1.5rem;background:var(--straw);border-bottom:1px solid var(--rule);font-size:.9rem}
main{max-width:60rem;margin:0 auto;padding:1.5rem}
h1{font-size:1.7rem;font-weight:500;margin:.2rem 0 1rem}h2{font-size:1.2rem;font-weight:500;margin:1.6rem 0 .5rem}
a{color:var(--tint)}
table{width:100%;border-collapse:collapse;background:var(--sheet);border:1px solid var(--rule)}
caption{text-align:left;color:var(--ink2);padding:.3rem 0}
th,td{text-align:left;padding:.45rem .7rem;border-top:1px solid var(--rule);vertical-align:top;overflow-wrap:anywhere}
th{font-size:.85rem;color:var(--ink2)}td.number{text-align:right;font-variant-numeric:tabular-nums}
button{font:inherit;padding:.45rem .9rem;border:1px solid var(--rule);border-radius:6px;background:var(--sheet);color:var(--ink);cursor:pointer;min-height:2.4rem}
button.main{background:var(--tint);border-color:var(--tint);color:var(--paper);font-weight:600}
:focus-visible{outline:2px solid var(--tint);outline-offset:2px}
form{display:inline-block;margin:.15rem .3rem .15rem 0}
.card{background:var(--sheet);border:1px solid var(--rule);border-radius:10px;padding:1.2rem 1.4rem;margin:1rem 0}
.amount{font-size:2rem;margin:.2rem 0 .8rem}
.bad{color:var(--red)}.good{color:var(--green)}
dl{display:grid;grid-template-columns:max-content 1fr;gap:.2rem 1rem}dt{color:var(--ink2)}dd{margin:0;overflow-wrap:anywhere}
pre{white-space:pre-wrap;overflow-wrap:anywhere;background:var(--sheet);border:1px solid var(--rule);padding:1rem;font:14px/1.5 ui-monospace,monospace}
iframe{width:100%;height:32rem;border:1px solid var(--rule);background:#fff}
code{font:.9em ui-monospace,monospace}
`;
