// The report's stylesheet: one column to read, evidence side by side, light and dark, and plain on paper.
import { DARK, LIGHT } from './palette.js';
import type { Palette } from './palette.js';

function variables(palette: Palette): string {
  return Object.entries(palette)
    .map(([role, colour]) => `--${role}:${colour as string}`)
    .join(';');
}

/** The whole stylesheet; it names no font, image or address outside the file. */
export const STYLE = `
:root{color-scheme:light dark;${variables(LIGHT)};
--text:"Seravek","Gill Sans Nova",Ubuntu,Calibri,"DejaVu Sans",source-sans-pro,system-ui,sans-serif;
--book:"Iowan Old Style","Palatino Linotype","URW Palladio L",P052,Charter,Georgia,serif}
@media (prefers-color-scheme:dark){:root{${variables(DARK)}}}
*{box-sizing:border-box}
html{scroll-padding-top:1.5rem;-webkit-text-size-adjust:100%}
body{margin:0;background:var(--page);color:var(--ink);font:16px/1.55 var(--text)}
a{color:var(--link);text-underline-offset:.18em;text-decoration-thickness:1px}
a:focus-visible,summary:focus-visible,[tabindex]:focus-visible{outline:3px solid var(--second);outline-offset:3px;border-radius:2px}
.skip{position:absolute;left:-99rem}
.skip:focus{left:1rem;top:1rem;background:var(--panel);padding:.5rem 1rem;z-index:1}
.sheet{max-width:66rem;margin:0 auto;padding:3.5rem 2rem 5rem}
h1,h2,h3{font-family:var(--book);font-weight:600;line-height:1.2;text-wrap:balance}
h1{font-size:1.05rem;margin:0;letter-spacing:.01em}
h2{font-size:1.8rem;margin:0 0 .4rem}
h3{font-size:1.35rem;margin:0}
h4{font-size:1rem;margin:0 0 .6rem;font-weight:600}
p{margin:0 0 .8rem;max-width:44rem}
p,li,dd{text-wrap:pretty}
.faint,.place,figcaption,.note{color:var(--faint)}
.masthead{display:flex;flex-wrap:wrap;justify-content:space-between;gap:.2rem 2rem;border-bottom:3px double var(--line);padding-bottom:.8rem}
.masthead p{margin:0}
.state{font:600 clamp(1.55rem,1.1rem + 2vw,2.35rem)/1.25 var(--book);max-width:52rem;margin:2.4rem 0 2.6rem;text-wrap:balance}
.figures{display:grid;grid-template-columns:repeat(5,1fr);margin:0;border-top:1px solid var(--line);border-bottom:1px solid var(--line)}
.figures div{display:flex;flex-direction:column;padding:1rem 1.1rem 1.1rem;border-left:1px solid var(--line)}
.figures div:first-child{border-left:0;padding-left:0}
.figures dt{color:var(--faint);font-size:.9rem}
.figures .value{font:600 2.3rem/1.15 var(--book);font-variant-numeric:lining-nums;margin:.15rem 0 .2rem}
.figures .note{font-size:.85rem;line-height:1.35}
.figures dd{margin:0}
.contents{margin:2rem 0 0}
.contents ul{display:flex;flex-wrap:wrap;gap:.3rem 1.8rem;list-style:none;margin:0;padding:0}
.contents li{font-variant-numeric:tabular-nums}
section.part{margin-top:4rem}
.wide{overflow-x:auto}
table{border-collapse:collapse;width:100%;font-variant-numeric:tabular-nums lining-nums}
caption{text-align:left;color:var(--faint);font-size:.9rem;padding:0 0 .4rem}
th,td{text-align:left;vertical-align:baseline;padding:.42rem 1rem .42rem 0;border-top:1px solid var(--line);font-weight:400}
thead th,thead td{border-top:0}
thead th{color:var(--faint);font-size:.85rem}
tbody th{font-weight:600;overflow-wrap:break-word}
thead svg{display:inline-block;width:.65rem;height:.65rem;margin-right:.4rem}
.number{text-align:right;white-space:nowrap}
th:last-child,td:last-child{padding-right:0}
table.names tbody th{width:30%}
td.bar{width:34%;min-width:7rem;vertical-align:middle}
.glance td.bar{width:24%}
.glance th a{font-weight:600}
svg{display:block;width:100%;height:.8rem}
.track{fill:var(--line);opacity:.55}
.n0{fill:var(--first)}.n1{fill:var(--second)}.n2{fill:var(--third)}.n3{fill:var(--further)}
.entry{margin-top:1.6rem;padding:1.5rem 1.7rem 1.6rem;background:var(--panel);border:1px solid var(--line);border-radius:6px}
.entry header{display:flex;flex-wrap:wrap;align-items:baseline;justify-content:space-between;gap:.1rem 1.5rem;margin-bottom:.9rem}
.entry .kind{margin:0;color:var(--faint);font-size:.9rem}
.entry .count{color:var(--faint);font-weight:400;margin-right:.45em}
.drift{margin:1rem 0 0}
.drift strong{white-space:nowrap}
.reasons{margin:.9rem 0 0;padding-left:1.15rem;max-width:46rem}
.reasons li{margin:.2rem 0}
.evidence{display:grid;grid-template-columns:repeat(auto-fit,minmax(min(19rem,100%),1fr));gap:1.4rem 2.4rem;margin-top:1.5rem;border-top:1px solid var(--line);padding-top:1.2rem}
.evidence h4{padding-left:.7rem;border-left:4px solid var(--further);line-height:1.2}
.evidence .s0 h4{border-color:var(--first)}.evidence .s1 h4{border-color:var(--second)}.evidence .s2 h4{border-color:var(--third)}
.evidence ul{list-style:none;margin:0;padding:0}
.evidence li{margin:0 0 .95rem}
.evidence li p{margin:0;font-family:var(--book);font-size:1.02rem;line-height:1.5;overflow-wrap:anywhere}
.place{font-size:.82rem;overflow-wrap:anywhere}
mark{-webkit-box-decoration-break:clone;box-decoration-break:clone;background:transparent;color:inherit;font-weight:600;padding:.05em .15em;border-radius:3px;border-bottom:2px solid var(--further)}
.s0 mark{background:var(--firstGround);border-color:var(--first)}
.s1 mark{background:var(--secondGround);border-color:var(--second)}
.s2 mark{background:var(--thirdGround);border-color:var(--third)}
details{margin-top:1.1rem}
summary{cursor:pointer;color:var(--link);width:fit-content}
details[open] summary{margin-bottom:.7rem}
.status{white-space:nowrap}
.pairs{padding-left:1.15rem}
.terms dt{font-weight:600;margin-top:1rem}
.terms dd{margin:0;max-width:46rem}
footer{margin-top:4rem;padding-top:1rem;border-top:3px double var(--line);color:var(--faint);font-size:.9rem}
.unseen{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%);white-space:nowrap}
@media screen and (max-width:52rem){
.sheet{padding:2rem 1.15rem 3rem}
.state{margin:1.6rem 0}
.figures{grid-template-columns:repeat(2,1fr)}
.figures div,.figures div:first-child{padding:.8rem .9rem;border-left:0;border-top:1px solid var(--line)}
.figures div:nth-child(odd){padding-left:0}
.figures div:nth-child(-n+2){border-top:0}
.figures div:last-child:nth-child(odd){grid-column:1/-1}
.figures .value{font-size:1.9rem}
.entry{padding:1.1rem 1.05rem 1.2rem}
.glance .bar,.glance .extra,.decided .bar,.folders .bar{display:none}
td.bar{min-width:4.5rem;width:26%}
.folders .number{white-space:normal}
th,td{padding-right:.7rem}
h2{font-size:1.5rem}h3{font-size:1.18rem}
}
@media print{
:root{${variables(LIGHT)};--page:#fff;color-scheme:light}
body{font-size:10.5pt}
.sheet{max-width:none;padding:0}
.skip,.contents{display:none}
section.part{margin-top:2rem}
.entry{border:0;border-top:1px solid var(--line);border-radius:0;padding:1rem 0 0}
h2,h3,h4,thead,.entry header{break-after:avoid}
tr,.evidence li,.figures{break-inside:avoid}
a{color:inherit;text-decoration:none}
svg,mark{print-color-adjust:exact;-webkit-print-color-adjust:exact}
@page{margin:18mm 16mm}
}
`;
