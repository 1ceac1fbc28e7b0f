import { nightPalette, palette, paletteCss } from "./palette.ts";

/** The page's style: one column of text, wide figures, ruled tables; dark at night, quiet on paper. */
export const pageStyle: string = `
:root{${paletteCss(palette)};color-scheme:light dark}
@media (prefers-color-scheme:dark){:root{${paletteCss(nightPalette)}}}
*{box-sizing:border-box}
html{font:16px/1.55 system-ui,"Segoe UI",Roboto,"Helvetica Neue",Arial,sans-serif;background:var(--paper);color:var(--ink)}
body{margin:0 auto;max-width:60rem;padding:2.2rem 1.4rem 4rem}
h1,h2,h3{font-family:"Iowan Old Style","Palatino Linotype",Palatino,"Book Antiqua",Georgia,serif;line-height:1.2;font-weight:600;overflow-wrap:anywhere}
h1{font-size:2rem;margin:.2rem 0 .4rem}
h2{font-size:1.4rem;margin:2.6rem 0 .8rem;padding-top:.7rem;border-top:2px solid var(--main)}
h3{font-size:1.05rem;margin:1.6rem 0 .4rem}
p,li{max-width:46rem}
.kicker{color:var(--muted);margin:0;font-size:.95rem}
.answer{font-size:1.2rem;line-height:1.45;border-left:5px solid var(--main);padding:.1rem 0 .1rem 1rem;margin:1.2rem 0}
.answer strong{font-weight:650}
.quiet{color:var(--muted);font-size:.92rem}
figure{margin:1.3rem 0;break-inside:avoid;page-break-inside:avoid}
figure svg{max-width:100%;height:auto;display:block}
figcaption{font-size:.93rem;color:var(--muted);margin-top:.35rem;max-width:46rem}
figcaption b{color:var(--ink);font-weight:600}
.pair{display:grid;grid-template-columns:repeat(auto-fit,minmax(17rem,1fr));gap:0 1.6rem}
.scroll{overflow-x:auto}
table{border-collapse:collapse;width:100%;font-size:.92rem;margin:.8rem 0;font-variant-numeric:tabular-nums}
caption{text-align:left;color:var(--muted);padding-bottom:.3rem}
th,td{text-align:left;padding:.32rem .7rem .32rem 0;border-bottom:1px solid var(--grid);vertical-align:top}
th{font-weight:600;border-bottom:1.5px solid var(--muted)}
td.n,th.n{text-align:right}
td.n{white-space:nowrap}
tr.block th{padding-top:1rem;border-bottom:1px solid var(--muted);font-family:"Iowan Old Style",Palatino,Georgia,serif}
td.formula{font-family:"Cambria Math",Cambria,Georgia,serif;overflow-wrap:anywhere}
td .words{color:var(--muted)}
.density{width:110px;height:26px;display:block}
.cautions li{margin:.3rem 0}
code{font-family:ui-monospace,SFMono-Regular,Menlo,Consolas,monospace;font-size:.9em;overflow-wrap:anywhere}
footer{margin-top:3rem;border-top:1px solid var(--grid);padding-top:.8rem;color:var(--muted);font-size:.9rem}
@media print{
@page{margin:16mm 15mm}
:root{${paletteCss(palette)};color-scheme:light}
html{font-size:10.5pt}
body{max-width:none;padding:0}
h2{break-after:avoid;margin-top:1.6rem}
h3,caption{break-after:avoid}
tr{break-inside:avoid}
thead{display:table-header-group}
.scroll{overflow:visible}
}`.trim();
