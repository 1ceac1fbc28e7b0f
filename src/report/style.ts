import { cssString } from "./escape.ts";
import { nightPalette, palette, paletteCss } from "./palette.ts";

const serif = `"Iowan Old Style","Palatino Linotype","URW Palladio L",P052,Palatino,"Book Antiqua",Georgia,serif`;
const sans = `system-ui,-apple-system,"Segoe UI",Roboto,"Noto Sans","Helvetica Neue",Arial,sans-serif`;
const mono = `ui-monospace,SFMono-Regular,Menlo,Consolas,"DejaVu Sans Mono",monospace`;

/** One column of text and wide figures; ruled tables; the hatch of a ground surface over every heading. */
const screen = `
:root{${paletteCss(palette)};color-scheme:light dark}
@media (prefers-color-scheme:dark){:root{${paletteCss(nightPalette)}}}
*{box-sizing:border-box}
html{font:16px/1.55 ${sans};background:var(--paper);color:var(--ink);-webkit-text-size-adjust:100%;scroll-padding-top:1rem}
body{margin:0}
.page{display:grid;grid-template-columns:minmax(0,60rem);justify-content:center;padding:2.6rem 1.4rem 4rem}
.skip{position:absolute;left:-99rem}
.skip:focus{left:1rem;top:1rem;background:var(--paper);padding:.4rem .8rem;z-index:3}
a{color:var(--main);text-underline-offset:.15em}
:focus-visible{outline:2px solid var(--main);outline-offset:3px;border-radius:2px}
h1,h2,h3{font-family:${serif};line-height:1.2;font-weight:600;overflow-wrap:anywhere;text-wrap:balance}
h1{font-size:2.3rem;margin:.15rem 0 .6rem;letter-spacing:-.01em}
h2{font-size:1.55rem;margin:3.4rem 0 1rem}
h2::before{content:"";display:block;width:4.6rem;height:9px;margin-bottom:.8rem;border-top:2px solid var(--ink);background:repeating-linear-gradient(-45deg,var(--muted) 0 1px,transparent 1px 6px)}
h3{font-size:1.15rem;margin:2rem 0 .5rem}
p,li{max-width:44rem;overflow-wrap:break-word}
ul{padding-left:1.15rem}
li{margin:.35rem 0}
.kicker{color:var(--main);font-weight:600;margin:0;font-size:.95rem}
.notes{color:var(--muted);font-size:1rem}
nav.contents{margin:1.4rem 0 0;font-size:.92rem}
nav.contents ol{list-style:none;margin:0;padding:0;display:flex;flex-wrap:wrap;gap:.2rem 1.2rem}
nav.contents li{margin:0}
nav.contents a{text-decoration:none}
nav.contents a:hover{text-decoration:underline}
#answer h2{margin-top:2.4rem}
.answer{font-family:${serif};font-size:1.3rem;line-height:1.4;margin:1rem 0 .8rem;max-width:46rem}
.answer strong{display:block;font-size:3.1rem;line-height:1.1;font-weight:600;letter-spacing:-.015em;color:var(--main);margin-bottom:.35rem}
.against{border-left:3px solid var(--target);padding-left:.9rem;margin:1rem 0 1.2rem}
.callout{border-left:3px solid var(--fail);padding-left:.9rem;font-weight:600}
.quiet,caption,figcaption{color:var(--muted);font-size:.92rem}
figure{margin:1.8rem 0}
figure svg{display:block;max-width:100%;height:auto}
figcaption{margin-top:.55rem;max-width:44rem}
figcaption b{color:var(--ink);font-weight:600}
figure:has(+.scroll){margin-bottom:1rem}
.trio{align-items:start;display:grid;grid-template-columns:repeat(auto-fit,minmax(17rem,1fr));gap:0 1.2rem}
.scroll{overflow-x:auto}
table{border-collapse:collapse;width:100%;font-size:.9rem;line-height:1.4;margin:1.2rem 0;font-variant-numeric:tabular-nums lining-nums}
caption{text-align:left;padding-bottom:.5rem;max-width:44rem}
th,td{text-align:left;padding:.38rem .9rem .38rem 0;border-bottom:1px solid var(--grid);vertical-align:top;font-weight:400}
th:last-child,td:last-child{padding-right:0}
thead th{font-weight:600;color:var(--muted);font-size:.84rem;line-height:1.25;vertical-align:bottom;border-bottom:1.5px solid var(--ink)}
.n{text-align:right}
td.n{white-space:nowrap}
tbody tr:hover{background:var(--wash)}
.words,.numbers{display:block;color:var(--muted)}
.words{font-size:.86em}
.sheet .formula{font-family:"Cambria Math",Cambria,${serif};overflow-wrap:anywhere;font-size:1rem}
.sheet th.formula{white-space:nowrap}
.sheet sub{font-size:.75em;line-height:0}
tr.block:hover{background:none}
tr.block th{padding-top:1.3rem;font-family:${serif};font-weight:600;font-size:1rem;border-bottom-color:var(--muted)}
.density{width:112px;height:28px;display:block}
code{font-family:${mono};font-size:.88em;overflow-wrap:anywhere}
#cautions li{margin:.5rem 0}
footer{margin-top:3rem;border-top:1px solid var(--grid);padding-top:.6rem;color:var(--muted);font-size:.88rem}
footer p{margin:.2rem 0}
@media (min-width:82rem){
.page{grid-template-columns:11rem minmax(0,60rem);column-gap:3.2rem}
header,main,footer{grid-column:2}
nav.contents{grid-column:1;grid-row:1/span 3;margin:.3rem 0 0;position:sticky;top:2.6rem;align-self:start}
nav.contents ol{display:block}
nav.contents li{margin:.45rem 0}
}
@media (max-width:46rem){
h1{font-size:1.8rem}
.answer strong{font-size:2.3rem}
figure svg:not(.density){max-width:none;min-width:40rem}
.trio figure svg{min-width:0;max-width:100%}
}`;

/** Controls that only the page's script brings in. */
const lively = `
.picker{display:flex;flex-wrap:wrap;gap:.4rem;align-items:center;margin:1rem 0;font-size:.9rem;color:var(--muted)}
.picker button,th button{font:inherit;color:inherit;background:none;border:1px solid var(--muted);border-radius:1rem;padding:.2rem .8rem;cursor:pointer}
.picker button[aria-pressed=true]{background:var(--main);border-color:var(--main);color:var(--paper)}
th button{border:0;border-radius:0;padding:0;text-align:inherit;font-weight:600;text-decoration:underline dotted;text-underline-offset:.2em}
th[aria-sort] button{color:var(--ink);text-decoration-style:solid}
svg [data-tip]{cursor:default}
svg [data-tip]:hover{filter:brightness(1.15)}
.dim{opacity:.22}
figure.dim{display:none}
#tip{position:fixed;z-index:4;pointer-events:none;max-width:22rem;background:var(--ink);color:var(--paper);font-size:.86rem;line-height:1.35;padding:.4rem .65rem;border-radius:3px}`;

/** On paper: light whatever the screen, a chart with its caption, heads of tables on every page, page numbers. */
const print = (title: string): string => `
@media print{
@page{margin:17mm 16mm 19mm;@bottom-left{content:${cssString(title)};font:8.5pt ${sans};color:${palette.muted}}@bottom-right{content:counter(page) " / " counter(pages);font:8.5pt ${sans};color:${palette.muted}}}
:root{${paletteCss(palette)};color-scheme:light}
html{font-size:9.6pt;background:none}
.page{display:block;padding:0}
nav.contents,.skip,.picker,#tip{display:none}
h1{font-size:20pt;margin-top:0}
h2{margin:1.9rem 0 .7rem;break-inside:avoid;break-after:avoid}
h2::before{-webkit-print-color-adjust:exact;print-color-adjust:exact}
h3,caption{break-after:avoid}
.answer strong{font-size:2.6rem}
p,li{orphans:3;widows:3;max-width:none}
figure{break-inside:avoid;margin:1.2rem 0}
figure.dim{display:block}
.dim{opacity:1}
figcaption{max-width:none}
tr,.against,.callout{break-inside:avoid}
tr.block{break-after:avoid}
thead{display:table-header-group;break-inside:avoid;break-after:avoid}
table.short{break-inside:avoid}
tbody tr:hover{background:none}
table{margin:.8rem 0;font-size:.88rem}
th,td{padding:.25rem .7rem .25rem 0}
.sheet{font-size:.82rem}
.sheet .formula{font-size:.9rem}
.sheet td,.sheet th{padding-top:.14rem;padding-bottom:.14rem}
tr.block th{padding-top:.7rem}
.scroll{overflow:visible}
.trio{grid-template-columns:repeat(3,1fr)}
a{color:inherit;text-decoration:none}
}`;

/** The page's style sheet; the title stands at the foot of every printed page. */
export const pageStyle = (title: string): string => `${screen}${lively}${print(title)}`.trim();
