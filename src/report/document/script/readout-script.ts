/**
 * The one script of the document, run by the reader's browser and not by this library: a cursor on charts. Everything that is
 * needed to decide stands in the document without it. Its digest stands in the policy, so it takes nothing from a design.
 */
export const READOUT_SCRIPT = `
(() => {
  'use strict';
  const source = document.getElementById('sweep-data');
  if (source === null) return;
  const data = JSON.parse(source.textContent);
  const { hz, unit } = data;
  const box = document.getElementById('show-lossless');
  const hint = 'Point at the picture, or reach it with Tab and use the arrow keys.';
  const number = (value, digits) => value.toFixed(digits).replace(/^-(?=[0.]+$)/, '').replace('-', '\\u2212');
  const delayText = (ns) => number((ns * 1e-9) / unit.delay.seconds, unit.delay.digits) + ' ' + unit.delay.name;

  const values = (name, loss, match, delay) =>
    name + 'loss ' + number(loss, 2) + ' dB, return loss ' + number(match, 2) + ' dB, delay ' + delayText(delay);

  /** What the reserved line says of a sweep point: with loss, then lossless where that is shown. */
  const sentences = (n) => {
    const own = [
      (hz[n] / unit.hertz).toFixed(unit.digits) + ' ' + unit.name,
      values('', data.s21Db[n], data.s11Db[n], data.delayNs[n]),
    ];
    if (box === null || !box.checked || data.s21LosslessDb === undefined) return own;
    const lossless = [data.s21LosslessDb[n], data.s11LosslessDb[n], data.delayLosslessNs[n]];
    return own.concat(values('lossless: ', ...lossless));
  };

  /** Index of the sweep point nearest to a frequency. */
  const nearest = (wanted) => {
    let low = 0;
    let high = hz.length - 1;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (hz[middle] > wanted) high = middle;
      else low = middle;
    }
    return wanted - hz[low] <= hz[high] - wanted ? low : high;
  };

  /** The drawing that is shown, and where its plot stands. */
  const plotOf = (chart) => {
    const svg = [...chart.querySelectorAll('svg')].find((each) => each.getClientRects().length > 0);
    const group = svg && svg.querySelector('.plot');
    if (!group) return undefined;
    const number = (name) => Number(group.dataset[name]);
    const [left, right, top, bottom] = ['left', 'right', 'top', 'bottom'].map(number);
    return { svg, group, left, right, top, bottom, fromHz: number('fromHz'), toHz: number('toHz') };
  };

  const clear = (chart) => chart.querySelectorAll('.cursor').forEach((each) => each.remove());

  const hairline = (plot, wanted) => {
    const share = (wanted - plot.fromHz) / (plot.toHz - plot.fromHz);
    const x = String(plot.left + share * (plot.right - plot.left));
    const line = document.createElementNS('http://www.w3.org/2000/svg', 'line');
    const places = { x1: x, x2: x, y1: plot.top, y2: plot.bottom, class: 'cursor hair s-ink' };
    for (const [name, value] of Object.entries(places)) line.setAttribute(name, value);
    plot.group.append(line);
  };

  const start = (chart) => {
    const line = chart.querySelector('.readout');
    if (line === null) return;
    let at = -1;

    const say = (texts) => {
      line.replaceChildren(
        ...texts.map((text) => {
          const part = document.createElement('b');
          part.textContent = text;
          return part;
        }),
      );
    };

    const hide = () => {
      at = -1;
      clear(chart);
      line.textContent = hint;
    };

    const show = (n, plot) => {
      const [first, last] = [nearest(plot.fromHz), nearest(plot.toHz)];
      at = Math.min(Math.max(n, hz[first] < plot.fromHz ? first + 1 : first), hz[last] > plot.toHz ? last - 1 : last);
      clear(chart);
      hairline(plot, hz[at]);
      say(sentences(at));
    };

    chart.addEventListener('pointermove', (event) => {
      const plot = plotOf(chart);
      if (plot === undefined || !plot.svg.contains(event.target)) return;
      const frame = plot.svg.getBoundingClientRect();
      const x = ((event.clientX - frame.left) * plot.svg.viewBox.baseVal.width) / frame.width;
      const share = (x - plot.left) / (plot.right - plot.left);
      if (share >= 0 && share <= 1) show(nearest(plot.fromHz + share * (plot.toHz - plot.fromHz)), plot);
    });
    chart.addEventListener('pointerleave', () => {
      if (document.activeElement !== chart) hide();
    });
    chart.addEventListener('keydown', (event) => {
      const plot = plotOf(chart);
      if (plot === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
      const step = event.shiftKey ? 10 : 1;
      const from = at < 0 ? nearest((plot.fromHz + plot.toHz) / 2) : at;
      const moves = { ArrowRight: from + step, ArrowUp: from + step, ArrowLeft: from - step, ArrowDown: from - step };
      const target = { ...moves, Home: 0, End: hz.length - 1 }[event.key];
      if (event.key === 'Escape') hide();
      else if (target !== undefined) show(at < 0 && event.key.startsWith('Arrow') ? from : target, plot);
      else return;
      event.preventDefault();
    });
    if (box !== null) box.addEventListener('change', () => at >= 0 && say(sentences(at)));

    chart.tabIndex = 0;
    chart.setAttribute('role', 'group');
    chart.setAttribute('aria-label', 'Cursor: arrow keys step through the sweep, with Shift by ten points; Escape hides it');
    chart.setAttribute('aria-describedby', line.id);
    line.hidden = false;
    hide();
  };

  document.querySelectorAll('.chart').forEach(start);
})();
`;
