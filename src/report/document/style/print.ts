/** Print on A4 and letter: the first page holds ten requirements and the response; nothing breaks that can be kept whole. */
export const PRINT_RULES: string = `
@page{margin:13mm 12mm;@bottom-left{content:'irisloom';font:7pt sans-serif}@bottom-right{content:counter(page) ' of ' counter(pages);font:7pt sans-serif}}
@media print{
body{padding:0;max-width:none;font-size:8.5pt;line-height:1.4;background:none}
.skip,nav,label,.readout,.on-screen,summary{display:none}
.count{font-size:7.5pt}
.limits .note,.limits .on-paper{display:inline;margin-right:1em}
.limits .on-screen{display:none}
.running{display:block;font-size:7pt;margin-bottom:1mm;text-align:right;color:var(--second);break-after:avoid}
.note{break-before:avoid}
#mask-points tbody th{white-space:nowrap}
details caption{font-size:9pt;padding-bottom:6px}
h1{font-size:25pt;line-height:1.08}
h2{font-size:14pt;break-after:avoid}
h3,caption{font-size:9pt;break-after:avoid}
.kicker,dt,.conditions,.note,figcaption,.signatures p{font-size:8pt}
.title{padding-bottom:2mm;column-gap:5mm}
.facts{flex:1 1 0}
.facts,.emblem,.cells{margin-top:2mm}
.cells div{padding:1mm 1.6mm}
dd{font-size:8pt}
.verdict{padding:2mm 0 1.5mm}
.verdict.short{margin:2mm 0 1.5mm;padding-block:0}
.verdict h2{font-size:18pt}
.nearest{font-size:10.5pt;margin-top:1mm}
.conditions{margin-top:1mm}
.note{max-width:none}
table,thead th{font-size:8.5pt}
th,td{padding:.9mm 0 .9mm 2mm}
#requirements :is(th,td){padding-block:.3mm}
#requirements .strip{width:28mm;height:auto}
#certificates :is(th,td){padding-block:.35mm}
.half table{font-size:8pt}
.half :is(th,td):not(:first-child){padding-left:1.3mm}
#couplings td{white-space:normal}
#couplings td:not(.l){white-space:nowrap}
.unit,#requirements thead .share .unit{font-size:7.5pt}
.answer{display:grid;grid-template:auto auto/122mm minmax(0,1fr);gap:0 7mm}
.answer .limits{grid-column:1/-1}
.answer figure{grid-area:2/1/3/3;margin-top:2mm}
.answer .wide{width:122mm}
.answer .signatures{grid-area:2/2;align-self:end;flex-direction:column;gap:9mm;margin:0 0 6mm}
.signatures p{flex-direction:row;gap:3mm}
.signatures span{flex:3 1 0}
.signatures span+span{flex:2 1 0}
.first{break-after:page}
.sheet{margin-top:0;padding-top:1.5mm}
.sheet+.sheet{margin-top:8mm}
.pair{grid-template-columns:minmax(0,1fr) minmax(0,1fr);gap:6mm 7mm;margin-top:3mm}
.pair>div{gap:6mm}
.pair>.wide{grid-column:1/-1}
.pair>.tall{grid-row:span 2}
#evidence .pair>:nth-child(-n+2){grid-column:1/-1}
#evidence .pair>:nth-child(2){order:-1;grid-template-columns:repeat(3,minmax(0,1fr))}
figure,table,.text,dl,.verdict,.signatures,tr{break-inside:avoid}
thead{display:table-header-group}
.scroll{overflow:visible}
.figures td{font-size:7pt}
[id^=matrix] :is(th,td){font-size:7pt}
[id^=matrix] :is(th,td):not(:first-child){padding-left:5px}
details::details-content{content-visibility:visible;display:block;block-size:auto}}
`.trim();
