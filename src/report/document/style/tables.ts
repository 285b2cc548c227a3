const CODE = 'ui-monospace,Consolas,"Liberation Mono","DejaVu Sans Mono",monospace';

/** Widths at which requirements stand beside the response and have no room for one line each. */
const BESIDE = 'screen and (min-width:1060px) and (max-width:1319px)';

/** Tables: words left, numbers right with equal decimals, hairlines between rows and nothing else. */
export const TABLES: string = `
table{border-collapse:collapse;width:100%;font-size:15px;line-height:1.35}
caption{text-align:left;font-weight:700;font-size:16px;padding-bottom:6px}
th,td{padding:5px 0 5px 16px;text-align:right;font-weight:400;vertical-align:baseline;white-space:nowrap;
border-bottom:1px solid var(--hairline)}
th:first-child,td:first-child{padding-left:0}
th:not(.n),td.l{text-align:left}
thead th{color:var(--second);font-size:14px;white-space:normal;vertical-align:bottom;border-bottom:1.5px solid var(--ink)}
.unit{color:var(--second);font-size:13px}
td.l{white-space:normal}
tbody th:not(.n){white-space:normal}
tr.tightest :is(th,td){font-weight:700}
tr.negative :is(th,td){font-weight:700;color:var(--negative)}
tr.short :is(th,td){color:var(--short);font-weight:700}
.again,.count{color:var(--second)}
.count{font-size:13px;font-weight:400}
.on-paper{display:none}
.tightest .again,.short .again,.short .count{color:inherit}
.note{font-size:14px;color:var(--second);margin-top:6px;max-width:68ch}
.scroll{overflow-x:auto}
.figures td{font:13px/1.35 ${CODE}}
.figures td,.figures th.n{text-align:right}
#matrix,[id^=matrix-]{width:auto}
[id^=matrix] :is(th,td){font-size:13.5px}
[id^=matrix] :is(th,td):not(:first-child){padding-left:10px}
[id^=matrix] thead th:not(:first-child){text-align:right}
.words td{white-space:normal;overflow-wrap:anywhere}
.words tbody th{width:9em;color:var(--second);white-space:normal}
#requirements td{vertical-align:middle}
#requirements th{vertical-align:middle}
#requirements thead th{vertical-align:bottom}
#requirements .room{font-weight:700}
#requirements .over{white-space:nowrap}
#requirements .share{width:136px;text-align:left;white-space:nowrap}
#couplings td{white-space:nowrap}
#requirements thead .share .unit{display:block;white-space:nowrap;padding-left:22px;font-size:13px}
#requirements td.share{padding-block:0}
.strip{display:block}
.word{display:none}
summary{cursor:pointer;font-weight:700;padding:4px 0;width:fit-content}
details caption{font-size:0;padding:0}
@media print,(min-width:768px) and (max-width:1059px){#requirements :is(th,td):not(:first-child){padding-left:12px}}
@media (min-width:1320px){#requirements{font-size:14.5px}
#requirements :is(th,td):not(:first-child){padding-left:8px}
#requirements .share{width:132px}}
@media screen and (max-width:767px),${BESIDE}{
#requirements{display:block}
#requirements thead{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%)}
#requirements tbody{display:block;border-top:1.5px solid var(--ink)}
#requirements tbody tr{display:grid;grid-template-columns:minmax(0,1fr) auto minmax(108px,auto);column-gap:10px;padding:7px 0;
border-bottom:1px solid var(--hairline)}
#requirements tbody :is(th,td):is(th,td){border:0;padding:0;font-size:14.5px}
#requirements tbody th{grid-area:1/1/2/3;font-size:15px}
#requirements .room{grid-area:1/3;font-size:15px}
#requirements .over{grid-area:2/1;text-align:left}
#requirements .limit{grid-area:2/2}
#requirements .predicted{grid-area:2/3}
#requirements .share{grid-area:3/1/4/4;width:auto;display:flex;align-items:center;gap:8px}
#requirements .word{display:inline;color:var(--second);font-weight:400}}
@media (max-width:639px){
th,td{padding-left:10px}
caption{max-width:calc(100vw - 20px)}
#certificates{font-size:13.5px}
#certificates :is(th,td){padding-left:8px}
#certificates :is(th,td):nth-child(n+2){white-space:normal}
#certificates :is(th,td):first-child{padding-left:0}}
`.trim();
