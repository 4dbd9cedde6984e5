import { interferenceGradient } from "#app/domain/interference-colour.ts";

/** The register's own small style sheet, inline so that the page is one answer; both rooms, wide and narrow, and paper. */
export const registerStyle = `
:root{--paper:#faf8f3;--sheet:#fffefb;--ink:#211c29;--ink2:#5d5666;--rule:#e6e0d4;--tint:#6a1b7d;--green:#1b6b4a;--greenbg:#e3f1e9;--red:#a62a3b;--redbg:#fae7e6;--straw:#7a5200;--strawbg:#fbf1d9}
@media (prefers-color-scheme:dark){:root{--paper:#131016;--sheet:#1a161f;--ink:#eadfd0;--ink2:#b3a799;--rule:#3d3545;--tint:#c58bd6;--green:#7cc7a0;--greenbg:#15271f;--red:#ea8a8f;--redbg:#2e1719;--straw:#e3b04b;--strawbg:#2b2212}}
*{box-sizing:border-box}body{margin:0;background:var(--paper);color:var(--ink);font:16px/1.5 "IBM Plex Sans",system-ui,sans-serif}
.ramp{height:4px;background:${interferenceGradient()}}
main{max-width:44rem;margin:0 auto;padding:1.25rem 1.25rem 3rem}
header{display:flex;gap:.75rem;align-items:center;margin-bottom:1.1rem}
.mark{width:2.5rem;height:2.5rem;border-radius:.5rem;background:var(--ink);color:var(--paper);display:grid;place-items:center;font:500 1.05rem Lora,Georgia,serif;flex:none}
h1,h2,.lab{font-family:Lora,Georgia,serif;font-weight:500;line-height:1.25}
.lab{font-size:1.15rem;margin:0}.lab+p{margin:0;color:var(--ink2);font-size:.875rem}
h1{font-size:1.65rem;margin:1.4rem 0 .2rem}h2{font-size:1.15rem;margin:1.4rem 0 .3rem}
.state{display:flex;gap:.9rem;align-items:flex-start;border-radius:.6rem;padding:1rem}
.state svg{flex:none;width:1.75rem;height:1.75rem;margin-top:.1rem}b{font-weight:600}.state b{display:block}.state p{margin:0;font-size:.9rem}
.good{background:var(--greenbg);color:var(--green)}.bad{background:var(--redbg);color:var(--red)}.care{background:var(--strawbg);color:var(--straw)}
.sub{color:var(--ink2);margin:.1rem 0 0}
.two{display:grid;gap:0 1.5rem}@media (min-width:40rem){.two.pic{grid-template-columns:1fr 15rem}}
.two img{width:100%;max-width:22rem;height:auto;border-radius:.5rem;display:block;margin:1rem 0 0}
dl{display:grid;grid-template-columns:minmax(6.5rem,8.5rem) 1fr;gap:.35rem .8rem;border-top:1px solid var(--rule);border-bottom:1px solid var(--rule);padding:1rem 0;margin:1rem 0;align-content:start}
dt{color:var(--ink2)}dd{margin:0;overflow-wrap:anywhere}.mono{font-family:"IBM Plex Mono",ui-monospace,monospace;font-size:.95em}
a{color:var(--tint)}a:focus-visible,input:focus-visible,button:focus-visible{outline:3px solid var(--tint);outline-offset:2px}
.box{border:1px dashed var(--rule);border-radius:.6rem;padding:1rem;text-align:center;margin-top:1rem}
.small{color:var(--ink2);font-size:.9rem}
form{display:grid;gap:.6rem;margin-top:1rem}label{font-weight:600}
input{font:500 1.15rem "IBM Plex Mono",ui-monospace,monospace;padding:.6rem .7rem;border:1px solid var(--ink2);border-radius:.4rem;background:var(--sheet);color:var(--ink);width:100%}
button{font:inherit;font-weight:600;padding:.65rem 1rem;border:0;border-radius:.4rem;background:var(--tint);color:var(--paper);justify-self:start;min-height:44px;cursor:pointer}
@media print{:root{--paper:#fff;--ink:#000;--ink2:#333}.box{display:none}}
`.replace(/\n/g, "");
