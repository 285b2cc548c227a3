/** Print on A4 and letter: the first page holds ten requirements and the response; nothing breaks that can be kept whole. */
export const PRINT_RULES: string = `
@page{margin:13mm 12mm}
@media print{
body{padding:0;max-width:none;font-size:8.5pt;line-height:1.4;background:none}
.skip,nav,label,.readout{display:none}
h1{font-size:25pt}
h2{font-size:14pt;break-after:avoid}
h3,caption{font-size:9pt;break-after:avoid}
.kicker,dt,.conditions,.note,figcaption,.signatures p{font-size:8pt}
.title{flex-wrap:nowrap;padding-bottom:3mm}
.name{flex:1 1 0}
.cells div{padding:1mm 2.5mm}
.verdict{padding:3.5mm 0 3mm}
.verdict.short{margin:3.5mm 0 3mm}
.verdict h2{font-size:18pt}
.nearest{font-size:11pt}
table,thead th{font-size:8.5pt}
th,td{padding-block:1mm}
.unit,#requirements thead .share .unit{font-size:7.5pt}
.answer{display:block}
.answer figure{margin-top:5mm}
.answer .wide{width:122mm}
.signatures{margin-top:11mm;max-width:none}
.first{break-after:page}
.sheet{margin-top:0;padding-top:3mm}
.sheet+.sheet{margin-top:8mm}
.pair{grid-template-columns:minmax(0,1fr) minmax(0,1fr);gap:6mm 7mm;margin-top:3mm}
.pair>div{gap:6mm}
.pair>.wide{grid-column:1/-1}
.pair>.tall{grid-row:span 2}
figure,table,.text,dl,.verdict,.signatures,tr{break-inside:avoid}
thead{display:table-header-group}
.scroll{overflow:visible}
.figures td{font-size:7pt}
[id^=matrix] :is(th,td){font-size:7pt}
[id^=matrix] :is(th,td):not(:first-child){padding-left:5px}
details::details-content{content-visibility:visible;display:block;block-size:auto}
summary{list-style:none;font-size:9pt}}
`.trim();
