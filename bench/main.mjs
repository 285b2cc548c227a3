import { loadavg } from 'node:os';
import {
  arrow,
  bessel,
  certify,
  design,
  elliptic,
  folded,
  generalizedChebyshev,
  reportHtml,
  sweep,
  transversal,
} from '../dist/index.js';
import { denseSweep } from './dense-baseline.mjs';
import { fixedLoop, medians } from './measure.mjs';

const POINTS = 10_001;
const LOSS = 0.01;
const ZEROS = [1.2, -1.3, 1.5, -1.6];

const grid = Float64Array.from({ length: POINTS }, (_, n) => -3 + (6 * n) / (POINTS - 1));
const responseOf = (order) => generalizedChebyshev({ order, returnLossDb: 22, transmissionZeros: ZEROS });
const designOf = (order) => folded(transversal(responseOf(order)));

/** The folded matrix of the bench with one coupling changed: no longer the same seen from both ports. */
function lopsided(matrix) {
  const values = matrix.values.map((row) => [...row]);
  values[0][1] = values[1][0] = 0.8 * values[0][1];
  return { order: matrix.order, values };
}

const rows = [];
const say = (what, figure, target, holds) => rows.push({ what, figure, target, holds: holds ? 'yes' : 'NO' });
const round = (x, digits = 3) => Number(x.toPrecision(digits));

function checkEqual(a, b) {
  let worst = 0;
  for (const name of ['s11', 's21', 's22']) {
    for (let n = 0; n < POINTS; n++) worst = Math.max(worst, Math.hypot(a[name].re[n] - b[name].re[n], a[name].im[n] - b[name].im[n]));
  }
  if (!(worst < 1e-12)) throw new Error(`the sweep differs from its baseline by ${worst}`);
}

console.log(`node ${process.version}, load ${loadavg().map((x) => x.toFixed(2)).join(' ')}`);
const symmetric = designOf(10).matrix;
const general = lopsided(symmetric);
checkEqual(sweep(symmetric, grid, { loss: LOSS }), denseSweep(transversal(responseOf(10)).values, LOSS, grid));
checkEqual(sweep(general, grid, { loss: LOSS }), denseSweep(general.values, LOSS, grid));

const transversalValues = transversal(responseOf(10)).values;
const sweeps = await medians({
  dense: () => denseSweep(transversalValues, LOSS, grid),
  symmetric: () => sweep(symmetric, grid, { loss: LOSS }),
  general: () => sweep(general, grid, { loss: LOSS }),
  lossless: () => sweep(symmetric, grid),
  separate: () => sweep(symmetric, grid, { loss: Array.from({ length: 10 }, (_, n) => 0.01 + 0.001 * n) }),
});
const nanoseconds = (name) => (sweeps[name] * 1e6) / POINTS;
const faster = (name) => sweeps.dense / sweeps[name];
say('dense elimination, baseline, order 10', `${round(nanoseconds('dense'))} ns a point`, '-', true);
say('sweep, S11 = S22, one Q', `${round(nanoseconds('symmetric'))} ns a point, ${round(faster('symmetric'))} times faster`, '>= 45', faster('symmetric') >= 45);
say('sweep, any matrix, one Q', `${round(nanoseconds('general'))} ns a point, ${round(faster('general'))} times faster`, '>= 20', faster('general') >= 20);
say('sweep, S11 = S22, lossless', `${round(nanoseconds('lossless'))} ns a point, ${round(faster('lossless'))} times faster`, '-', true);
say('sweep, a Q for each resonator', `${round(nanoseconds('separate'))} ns a point, ${round(faster('separate'))} times faster`, '-', true);

const orders = [10, 12, 20, 40, 80];
const designs = await medians({
  loop: fixedLoop,
  ...Object.fromEntries(orders.map((order) => [`folded ${order}`, () => designOf(order)])),
  'arrow 40': () => arrow(transversal(responseOf(40))),
});
for (const order of orders) {
  const time = designs[`folded ${order}`];
  const target = { 12: 1, 40: 12 }[order];
  say(`specification to folded matrix, order ${order}`, `${round(time)} ms, ${round(time / designs.loop)} fixed loops`, target === undefined ? '-' : `<= ${target} ms`, target === undefined || time <= target);
}
say('specification to arrow matrix, order 40', `${round(designs['arrow 40'])} ms`, '-', true);
const growth = Math.log(designs['folded 80'] / designs['folded 10']) / Math.log(8);
say('growth from order 10 to 80', `order^${round(growth)}`, '<= 2.6', growth <= 2.6);

const flat = { 12: bessel({ order: 12, edge: 'halfPower' }), 25: bessel({ order: 25, edge: 'halfPower' }) };
const others = await medians({
  'elliptic response, order 12': () => elliptic({ order: 12, returnLossDb: 22, rejectionDb: 60 }),
  'Bessel response, order 12': () => bessel({ order: 12, edge: 'halfPower' }),
  'transversal matrix, S11 other than S22, order 12': () => transversal(flat[12]),
  'transversal matrix, S11 other than S22, order 25': () => transversal(flat[25]),
});
for (const [what, time] of Object.entries(others)) say(what, `${round(time)} ms`, '-', true);

const forty = responseOf(40);
const fortyStart = transversal(forty);
const fortyMatrix = folded(fortyStart).matrix;
const proofs = await medians({ certify: () => certify(forty, fortyMatrix), all: () => certify(forty, fortyMatrix, { before: fortyStart, structure: 'folded' }) });
say('certify, order 40', `${round(proofs.certify)} ms`, '<= 150 ms', proofs.certify <= 150);
say('certify with rotation and structure, order 40', `${round(proofs.all)} ms`, '<= 150 ms', proofs.all <= 150);

const reported = design({
  passband: { lowerHz: '3822 MHz', upperHz: '3858 MHz' },
  order: 14,
  returnLossDb: 22,
  transmissionZeros: [1.2, -1.2, 1.5, -1.5],
  unloadedQ: 9000,
  sweep: { fromHz: '3780 MHz', toHz: '3900 MHz', points: 2001 },
  mask: [
    { toHz: '3812 MHz', rejectionDb: 50 },
    { fromHz: '3868 MHz', rejectionDb: 50 },
    { fromHz: '3823 MHz', toHz: '3857 MHz', returnLossDb: 20 },
    { fromHz: '3840 MHz', toHz: '3840 MHz', insertionLossDb: 1 },
    { fromHz: '3823 MHz', toHz: '3857 MHz', insertionLossVariationDb: 2 },
    { fromHz: '3823 MHz', toHz: '3857 MHz', groupDelayVariationSeconds: 200e-9 },
  ],
});
const begun = performance.now();
const page = reportHtml(reported);
const first = performance.now() - begun;
const { report } = await medians({ report: () => reportHtml(reported) });
say('report, order 14, 2001 points, first in a process', `${round(first)} ms`, '<= 150 ms', first <= 150);
say('report, order 14, 2001 points', `${round(report)} ms`, '<= 150 ms', report <= 150);
const kilobytes = new TextEncoder().encode(page).length / 1000;
say('size of that report', `${round(kilobytes)} kB`, '<= 500 kB', kilobytes <= 500);

const width = (key) => Math.max(key.length, ...rows.map((row) => row[key].length));
for (const row of rows) console.log(['what', 'figure', 'target', 'holds'].map((key) => row[key].padEnd(width(key))).join('  '));
if (rows.some(({ holds }) => holds === 'NO')) process.exitCode = 1;
