// Style rules for the place of things: one column of reasoning, a slim margin, rules in place of boxes.

export const layoutCss: string = `
*,*::before,*::after{box-sizing:border-box}
html{scroll-padding-top:16px}
@media (prefers-reduced-motion:no-preference){html{scroll-behavior:smooth}}
body{margin:0;background:var(--desk);color:var(--ink)}
.skip{position:absolute;left:-999px;top:8px;padding:8px 14px;background:var(--paper);color:var(--deep);z-index:1}
.skip:focus{left:8px}
.sheet{max-width:1096px;margin:28px auto;padding:52px 60px 64px;background:var(--paper)}
.title-block{border-bottom:2px solid var(--ink);padding-bottom:12px;margin-bottom:32px}
.headline{display:grid;grid-template-columns:minmax(0,1fr) auto;column-gap:40px;align-items:end}
.findings{margin:18px 0 16px;padding-top:14px;border-top:1px solid var(--rule)}
.findings p{max-width:46em}
.title-block nav ol{display:flex;flex-wrap:wrap;gap:2px 18px;margin:0;padding:0;list-style:none}
.part{display:grid;grid-template-columns:140px minmax(0,1fr);column-gap:32px}
.margin,.body{border-top:1px solid var(--ink);padding-top:10px}
.body{padding-bottom:40px}
.say{max-width:43em;margin:0 0 11px}
.figure{margin:26px 0 14px}
figure{margin:0}
figure>svg{display:block;width:100%;height:auto;overflow:visible}
figure>h3{margin:0 0 8px}
figcaption{max-width:46em;margin:8px 0 0}
.side-by-side{display:grid;grid-template-columns:repeat(2,minmax(0,1fr));column-gap:28px}
.scroll{overflow-x:auto;margin:10px 0 14px;max-width:100%}
.folded{margin:8px 0 14px;padding-left:16px;border-left:1px solid var(--rule)}
.figure .folded{padding-left:0;border-left:0}
.say .fold,.say .fold>summary{display:inline}
.fold>summary{cursor:pointer;list-style:none}
.fold>summary::-webkit-details-marker{display:none}
.inputs{margin:8px 0;display:grid;grid-template-columns:max-content max-content;gap:2px 28px}
.inputs>div{display:contents}
.inputs dd{margin:0;text-align:right}
.verdicts{margin:18px 0 18px}
.bar-cell{width:40%;min-width:120px}
.bands .bar-cell{width:27%}
.by-season .bar-cell{width:30%}
.bar-line{display:block;width:100%;height:22px;overflow:visible}
.print-note{display:none}
.unseen{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%);white-space:nowrap}
@media (max-width:860px){
.sheet{margin:0;padding:36px 32px 48px}
.part{grid-template-columns:112px minmax(0,1fr);column-gap:22px}
}
@media screen and (max-width:700px){
.scroll th,.scroll td{white-space:nowrap}
.scroll caption{max-width:calc(100vw - 40px)}
.sheet{padding:24px 18px 40px}
.headline{grid-template-columns:minmax(0,1fr);row-gap:14px}
.part{grid-template-columns:minmax(0,1fr)}
.margin{padding-bottom:2px}
.body{border-top:0;padding-top:6px;padding-bottom:30px}
.facts{display:flex;flex-wrap:wrap;gap:0 14px}
.side-by-side{grid-template-columns:minmax(0,1fr)}
.inputs{grid-template-columns:minmax(0,1fr) max-content;column-gap:14px}
.verdicts,.verdicts tbody{display:block}
.verdicts thead{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%)}
.verdicts caption{display:block}
.verdicts tbody tr{display:grid;grid-template-columns:auto auto minmax(0,1fr);column-gap:12px;padding:9px 0 8px;align-items:baseline}
.verdicts tbody .group{padding:12px 0 3px}
.verdicts tbody th,.verdicts .bar-cell,.verdicts .finding{grid-column:1/-1;width:auto;padding:0}
.verdicts tbody td.num{padding:2px 0;text-align:left}
.verdicts .worst::before{content:"worst "}
.verdicts .limit-value::before{content:"limit "}
.verdicts .best::before{content:"best fit "}
.verdicts .median::before{content:"median "}
.verdicts .soils-range::before{content:"5–95 % of soils "}
.bands tbody tr{grid-template-columns:auto minmax(0,1fr)}
.verdicts td::before{color:var(--soft);font-weight:400}
}
`.trim();
