// Style rules for type: serif for sentences, sans for facts and figures, tabular lining numerals throughout.

const SERIF = '"Source Serif 4","Iowan Old Style",Palatino,"URW Palladio L","Noto Serif",Georgia,serif';
const SANS = 'ui-sans-serif,"Inter","Helvetica Neue",Arial,"DejaVu Sans",sans-serif';

export const textCss: string = `
body{font:16.5px/1.58 ${SERIF};font-variant-numeric:lining-nums;-webkit-text-size-adjust:100%;text-size-adjust:100%}
h1{font-size:29px;line-height:1.16;font-weight:600;letter-spacing:-.012em;margin:0;text-wrap:balance;overflow-wrap:anywhere}
h1 .sort{display:block;font-size:.68em;font-weight:400;letter-spacing:0;color:var(--soft)}
h2,h3,.facts,.project,.title-block nav,table,.fold>summary,.inputs,.clause,.fig{font-family:${SANS}}
h2{font-size:15.5px;line-height:1.3;font-weight:600;margin:0 0 3px}
h3{font-size:13.5px;line-height:1.35;font-weight:600;margin:22px 0 6px}
p{margin:0 0 11px}
.subtitle{margin:6px 0 0;color:var(--soft);font-size:15px}
.answer{margin:0;text-align:right;font-size:15.5px;line-height:1.3;color:var(--soft)}
.answer strong{display:block;font-size:26px;line-height:1.15;font-weight:600;color:var(--ink);letter-spacing:-.01em}
.answer.beyond strong{color:var(--beyond)}
.answer .rest{display:block;font-size:14px;margin-top:4px}
.findings p{margin:0 0 5px}
.title-block nav{font-size:12.5px}
.title-block nav a{display:inline-block;padding:5px 0}
a{color:var(--deep);text-decoration-thickness:1px;text-underline-offset:3px}
.title-block nav a{text-decoration-color:var(--rule)}
a:focus-visible,summary:focus-visible,.scroll:focus-visible{outline:2px solid var(--deep);outline-offset:3px}
.facts{margin:0;padding:0;list-style:none;font-size:12.5px;line-height:1.5;color:var(--soft);overflow-wrap:anywhere}
.in{background:var(--field);border-bottom:1.5px solid var(--deep);padding:0 4px;font-variant-numeric:lining-nums tabular-nums;-webkit-box-decoration-break:clone;box-decoration-break:clone}
.res{font-weight:600;font-variant-numeric:lining-nums tabular-nums;white-space:nowrap}
.case-name{font-weight:600;overflow-wrap:anywhere}
.fold>summary{font-size:12.5px;color:var(--deep);text-decoration:underline dotted 1px;text-underline-offset:3px}
.figure .fold{margin-top:4px}
.figure .fold>summary{display:inline-block;padding:3px 0}
figcaption{font-size:14.5px;line-height:1.5;color:var(--soft)}
.formula{font-size:16.5px;line-height:1.7}
.formula sub,.formula sup,.sym sub{font-size:.7em;line-height:0;font-style:normal}
.inputs{font-size:12.5px;line-height:1.5;font-variant-numeric:lining-nums tabular-nums}
.inputs .sym,.inputs dt>i{font-family:${SERIF};font-size:15px}
.inputs .meaning{color:var(--soft)}
.inputs .outcome dd{font-weight:600}
.clause{font-size:12.5px;color:var(--soft);max-width:52em}
table{border-collapse:collapse;width:100%;font-size:12.5px;line-height:1.4;font-variant-numeric:lining-nums tabular-nums}
caption{text-align:left;color:var(--soft);padding:0 0 6px;font-size:12.5px}
th,td{text-align:left;padding:5px 14px 5px 0;font-weight:400;vertical-align:baseline}
th:last-child,td:last-child{padding-right:0}
thead th{color:var(--soft);vertical-align:bottom}
tbody th{overflow-wrap:anywhere}
.num,.folded th{white-space:nowrap}
.num{text-align:right}
tr{border-bottom:1px solid var(--rule)}
.folded table,.scroll table{width:auto;min-width:60%}
.verdicts{width:100%}
.verdicts .worst{font-weight:600}
.verdicts .group th{font-weight:600;padding-top:12px}
.verdicts .finding{white-space:nowrap}
.verdicts .beyond .finding,.verdicts .beyond .worst{color:var(--beyond);font-weight:600}
.verdicts td.bar-cell{vertical-align:middle;padding-top:3px;padding-bottom:3px}
.verdicts .governing th{font-weight:600}
.verdicts .mark{white-space:nowrap}
.soils-told{color:var(--soft)}
.soils-told span{color:var(--ink);white-space:nowrap;font-variant-numeric:lining-nums tabular-nums}
.bands .best{font-weight:600}
.verdicts.bands .finding{white-space:normal;text-wrap:balance}
.bands .open .finding,.bands .beyond .finding{color:var(--beyond)}
.verdicts .limit-tick{stroke:var(--ink);stroke-width:2}
.caution{border-left:3px solid var(--beyond);padding:2px 0 2px 14px;max-width:43em;margin:18px 0 0}
.project{display:flex;flex-wrap:wrap;gap:2px 24px;margin:10px 0 0;font-size:12.5px}
.project dt,.project dd{display:inline;margin:0}
.project dt{color:var(--soft)}
.project dt::after{content:" "}
.revisions{margin:10px 0 0;width:auto;min-width:50%}
.note{margin:16px 0 0;max-width:43em}
.note h3{margin:0 0 4px}
.remarks,.cautions{margin:0 0 12px;padding:0;list-style:none;max-width:43em}
.remarks li,.cautions li{margin:0 0 7px;padding-left:18px;text-indent:-18px}
.remarks li::before,.cautions li::before{content:"–";display:inline-block;width:18px;text-indent:0;color:var(--soft)}
code{font:12px/1.4 ui-monospace,"DejaVu Sans Mono",monospace;color:var(--soft);overflow-wrap:anywhere}
@media (max-width:700px){body{font-size:16px}h1{font-size:24px}.answer{text-align:left}.answer strong{font-size:24px}}
`.trim();
