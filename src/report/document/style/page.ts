import { FONT } from '../../svg/picture-style.js';

const HEADS = 'Charter,"Bitstream Charter","Iowan Old Style","Palatino Linotype","Noto Serif",Georgia,serif';

/** Page, sheets, heads and text. */
export const PAGE: string = `
*,::before,::after{box-sizing:border-box}
html{-webkit-text-size-adjust:100%;text-size-adjust:100%}
body{margin:0 auto;max-width:1320px;padding:28px 36px 48px;background:var(--paper);color:var(--ink);
font:400 16px/1.45 ${FONT};font-variant-numeric:tabular-nums lining-nums;overflow-wrap:break-word}
bdi{overflow-wrap:anywhere}
h1,h1 bdi{overflow-wrap:break-word}
h1,h2,h3,p,dl,dd,ul,figure{margin:0}
h1,h2{font-family:${HEADS};font-weight:700;line-height:1.15;text-wrap:balance}
h1{font-size:44px}
h2{font-size:25px}
h3{font-size:16px;font-weight:700;line-height:1.3;text-wrap:balance}
a{color:var(--transmission)}
:focus-visible{outline:3px solid var(--transmission);outline-offset:2px}
[hidden],.running{display:none}
.skip{position:absolute;left:-999em}
.skip:focus{left:36px;top:6px;background:var(--paper);padding:4px 8px}
.unseen{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%);white-space:nowrap}
.title{display:flex;flex-wrap:wrap;align-items:center;gap:0 32px;padding-bottom:18px;border-bottom:3px solid var(--ink)}
.name{display:contents}
.kicker,h1{flex:0 0 100%;min-width:0}
.kicker,.facts{color:var(--second)}
.kicker{font-size:14px;margin-bottom:2px}
.facts{flex:1 1 320px;margin-top:10px}
.emblem,.cells{margin-top:12px}
.emblem{flex:none}
.cells{display:flex;flex-wrap:wrap;border:1px solid var(--hairline);border-width:1px 0 1px 1px}
.cells div{padding:5px 12px 6px;border-right:1px solid var(--hairline)}
dt{font-size:13px;color:var(--second)}
dd{font-weight:600}
.verdict{padding:20px 0 18px}
.verdict.short{border-left:8px solid var(--short);padding-left:16px;margin:20px 0 18px;padding-block:0}
.verdict h2{font-size:30px}
.nearest{font-size:20px;line-height:1.35;margin-top:6px}
.conditions{color:var(--second);margin-top:6px}
.signatures{display:flex;gap:24px;margin-top:20px;max-width:720px}
.signatures p{flex:1;display:flex;flex-direction:column;gap:34px;font-size:14px;color:var(--second)}
.signatures span{border-top:1.5px solid var(--ink);padding-top:4px}
nav{margin-top:36px}
nav ul{display:flex;flex-wrap:wrap;gap:4px 22px;padding:0;list-style:none}
.sheet{margin-top:36px;padding-top:16px;border-top:3px solid var(--ink)}
.pair,.answer{display:grid;grid-template-columns:minmax(0,1fr);gap:32px 48px;align-items:start}
.pair{margin-top:16px}
.pair>div{display:grid;grid-template-columns:minmax(0,1fr);gap:28px;align-content:start}
.pair>.wide:has(>.scroll+.scroll){display:flex;flex-wrap:wrap;gap:28px 36px}
.scroll{max-width:100%}
.text{max-width:68ch}
.text p,.text li{margin-top:6px}
.text ul{padding-left:20px}
@media (min-width:1060px){
.pair{grid-template-columns:minmax(0,1fr) minmax(0,1fr)}
.answer{grid-template:auto 1fr/minmax(0,12fr) minmax(0,11fr)}
.answer figure{grid-row:span 2}
.answer .signatures{align-self:end;width:100%;padding-top:34px}
.wide{grid-column:1/-1}
.tall{grid-row:span 2}}
@media (min-width:1320px){.answer{grid-template-columns:minmax(min-content,12fr) minmax(0,11fr)}}
@media (max-width:639px){
body{padding:16px 10px 32px}
h1{font-size:34px}
.verdict h2{font-size:24px}
.nearest{font-size:18px}
.cells{width:100%}
.cells div{flex:1 1 auto;padding-inline:8px}
.signatures{gap:10px}}
`.trim();
