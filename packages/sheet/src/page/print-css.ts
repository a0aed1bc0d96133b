// Style rules for paper: A4, figures kept whole, every fold open so that nothing is lost.

export const printCss: string = `
@media print{
@page{size:A4;margin:15mm 16mm 17mm;@bottom-right{content:counter(page) " of " counter(pages);font:8pt sans-serif;color:#5d6a6e}}
html,body{background:#fff}
*{print-color-adjust:exact;-webkit-print-color-adjust:exact}
body{font-size:9.8pt;line-height:1.45}
h1{font-size:17pt}
h2{font-size:9.2pt}
h3{font-size:8.6pt;margin-top:4mm}
.subtitle,.answer{font-size:9pt}
.answer strong{font-size:15pt}
.sheet{max-width:none;margin:0;padding:0;background:none}
.skip,.title-block nav{display:none}
.title-block{margin-bottom:6mm;padding-bottom:1mm}
.part{grid-template-columns:25mm minmax(0,1fr);column-gap:6mm}
.body{padding-bottom:6mm}
.say{margin-bottom:2mm}
h2,h3,caption,thead,summary{break-after:avoid}
.margin{align-self:start}
.verdicts,.margin,figure,tr,.say,.inputs,.caution,.remarks li,.cautions li{break-inside:avoid}
.figure{margin:5mm 0 2mm}
figure>svg{width:auto;max-width:100%;max-height:122mm;margin-left:0}
figcaption{font-size:8.4pt}
.fold,.say .fold{display:block}
.fold::details-content{content-visibility:visible;block-size:auto}
.fold>summary{color:#5d6a6e;text-decoration:none;font-size:7.6pt}
.fold>summary .unseen{position:static;width:auto;height:auto;clip-path:none;white-space:normal}
.say .fold>summary{display:none}
.folded{margin:1mm 0 2mm;padding-left:4mm}
.formula{font-size:9.8pt;line-height:1.5}
.inputs{display:block;margin:.5mm 0}
.inputs>div{display:inline-block;margin-right:5mm}
.inputs dt,.inputs dd{display:inline}
.inputs dt::after{content:" "}
.inputs .sym,.inputs dt>i{font-size:9pt}
.scroll{overflow:visible;margin:1mm 0 2mm}
table,.inputs,.clause,.facts,caption,code{font-size:7.4pt}
.folded th,.folded td{padding:1px 8px 1px 0}
.verdicts th,.verdicts td{padding-top:1mm;padding-bottom:1mm}
.bar-cell{width:34%}
.side-by-side .figure{display:contents}
.side-by-side .fold{grid-column:1/-1;order:1}
a{color:inherit;text-decoration:none}
}
@supports not selector(::details-content){@media print{.print-note{display:block;font-size:8pt}}}
`.trim();
