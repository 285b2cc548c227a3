import { loadavg } from 'node:os';
import { placeZeros, propose } from '../dist/proposal/index.js';
import { fixedLoop, medians } from './measure.mjs';

/** Rejection masks of a narrow channel, a front end, a base-station band, a cryogenic filter and a diplexer arm; unloaded Q. */
const MASKS = {
  'channel, order 6': { q: 9000, edges: [3822, 3858], returnLossDb: 22, below: [[3816, 24], [3812, 34]], above: [[3864, 24], [3868, 34]] },
  'front end, order 5': { q: 3500, edges: [2516, 2558], returnLossDb: 20, below: [[2480, 25], [2490, 19]], above: [[2563, 30, 2600], [2600, 42, 2700]] },
  'base station, order 7': { q: 4000, edges: [1850, 1910], returnLossDb: 21, below: [[1840, 32]], above: [[1915, 30], [1916, 38]] },
  'diplexer arm, order 7': { q: 3800, edges: [2304, 2346], returnLossDb: 22, below: [[2290, 20]], above: [[2357, 80, 2397]] },
  'cryogenic, order 11': { q: 80000, edges: [1942.5, 1957.5], returnLossDb: 22, below: [[1942, 40], [1941.5, 52], [1938, 75]], above: [[1958, 40], [1958.5, 52], [1962, 75]] },
};

const MHZ = 1e6;

function requestOf({ edges, returnLossDb, below, above }, q) {
  return {
    passband: { lowerHz: edges[0] * MHZ, upperHz: edges[1] * MHZ },
    returnLossDb,
    ...(q === undefined ? {} : { unloadedQ: q }),
    mask: [
      ...below.map(([to, rejectionDb]) => ({ toHz: to * MHZ, rejectionDb })),
      ...above.map(([from, rejectionDb, to]) => ({ fromHz: from * MHZ, rejectionDb, ...(to === undefined ? {} : { toHz: to * MHZ }) })),
    ],
  };
}

const round = (x, digits = 3) => Number(x.toPrecision(digits));
const rows = [];
const say = (what, time, loop, most) =>
  rows.push({ what, figure: `${round(time)} ms, ${round(time / loop)} fixed loops`, target: most === undefined ? '-' : `<= ${most} ms`, holds: most === undefined || time <= most ? 'yes' : 'NO' });

console.log(`node ${process.version}, load ${loadavg().map((x) => x.toFixed(2)).join(' ')}`);
const rejection = [{ toOmega: -1.2, rejectionDb: 40 }, { fromOmega: 1.2, toOmega: 1.6, rejectionDb: 60 }, { fromOmega: 1.6, rejectionDb: 50 }];
const times = await medians({
  loop: fixedLoop,
  place: () => placeZeros({ order: 9, zeroCount: 5, returnLossDb: 22, rejection }),
  ...Object.fromEntries(Object.entries(MASKS).flatMap(([name, mask]) => [[`${name}, lossless`, () => propose(requestOf(mask))], [`${name}, with loss`, () => propose(requestOf(mask, mask.q))]])),
});
say('placement of five zeros, order 9', times.place, times.loop);
for (const name of Object.keys(MASKS)) {
  say(`${name}, lossless`, times[`${name}, lossless`], times.loop, 50);
  say(`${name}, with loss`, times[`${name}, with loss`], times.loop, 2000);
}

const width = (key) => Math.max(key.length, ...rows.map((row) => row[key].length));
for (const row of [{ what: 'what', figure: 'p50', target: 'target', holds: 'holds' }, ...rows]) console.log(['what', 'figure', 'target', 'holds'].map((key) => row[key].padEnd(width(key))).join('  '));
if (rows.some(({ holds }) => holds === 'NO')) process.exitCode = 1;
