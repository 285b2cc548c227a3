import { pictureRules } from '../../svg/picture-style.js';

/** Figures: the drawing that fits its place at natural size, its caption beside it where there is room, the readout below. */
export const FIGURES: string = `
figure{container-type:inline-size;min-width:0}
figure .number{font-weight:400;color:var(--second);margin-right:6px}
.body{display:flex;flex-wrap:wrap;gap:6px 24px;margin-top:8px}
.drawing{flex:0 0 auto;max-width:100%;min-width:0}
figcaption{flex:1 1 176px;font-size:14px;line-height:1.4;color:var(--second);max-width:68ch}
.drawing .pic{display:block;max-width:100%;height:auto}
.drawing .wide{display:none}
@container (min-width:540px){.drawing .wide{display:block}.drawing .narrow{display:none}.drawing .readout{min-height:42px}}
.readout{min-height:63px;font-size:14px;line-height:21px;color:var(--second)}
.readout b{color:var(--ink);font-weight:600;margin-right:12px;white-space:nowrap}
.chart{cursor:crosshair}
label{display:flex;width:fit-content;gap:8px;align-items:center;margin-top:8px;color:var(--ink);cursor:pointer}
input{accent-color:var(--transmission);width:16px;height:16px;margin:0}
body:has(#show-lossless:not(:checked)) .lossless{display:none}
${pictureRules((role) => `var(--${role})`)}
`.trim();
