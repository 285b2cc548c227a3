/**
 * The fair baseline of a sweep: for every frequency a full complex LU elimination with partial pivoting of the (N+2) system
 * on typed arrays, no zero skipped, two right sides carried along, and the group delay from the two port columns.
 *
 * @param {readonly (readonly number[])[]} values coupling matrix
 * @param {number} loss common loss
 * @param {Float64Array} omega grid
 */
export function denseSweep(values, loss, omega) {
  const n = values.length;
  const width = n + 2;
  const re = new Float64Array(n * width);
  const im = new Float64Array(n * width);
  const flat = Float64Array.from(values.flat());
  const points = omega.length;
  const out = {
    s11: { re: new Float64Array(points), im: new Float64Array(points) },
    s21: { re: new Float64Array(points), im: new Float64Array(points) },
    s22: { re: new Float64Array(points), im: new Float64Array(points) },
    groupDelay: new Float64Array(points),
  };
  for (let p = 0; p < points; p++) {
    const w = omega[p];
    im.fill(0);
    for (let i = 0; i < n; i++) {
      const row = i * width;
      for (let j = 0; j < n; j++) re[row + j] = flat[i * n + j];
      const port = i === 0 || i === n - 1;
      if (!port) re[row + i] += w;
      im[row + i] = port ? -1 : -loss;
      re[row + n] = i === 0 ? 1 : 0;
      re[row + n + 1] = i === n - 1 ? 1 : 0;
    }
    for (let k = 0; k < n; k++) {
      const pivotRow = k * width;
      let best = k;
      let size = -1;
      for (let i = k; i < n; i++) {
        const a = re[i * width + k];
        const b = im[i * width + k];
        const square = a * a + b * b;
        if (square > size) {
          size = square;
          best = i;
        }
      }
      if (best !== k) {
        const other = best * width;
        for (let j = k; j < width; j++) {
          const a = re[pivotRow + j];
          re[pivotRow + j] = re[other + j];
          re[other + j] = a;
          const b = im[pivotRow + j];
          im[pivotRow + j] = im[other + j];
          im[other + j] = b;
        }
      }
      const inverse = 1 / size;
      const pr = re[pivotRow + k] * inverse;
      const pi = im[pivotRow + k] * inverse;
      for (let i = k + 1; i < n; i++) {
        const row = i * width;
        const a = re[row + k];
        const b = im[row + k];
        const fr = a * pr + b * pi;
        const fi = b * pr - a * pi;
        for (let j = k + 1; j < width; j++) {
          const x = re[pivotRow + j];
          const y = im[pivotRow + j];
          re[row + j] -= fr * x - fi * y;
          im[row + j] -= fr * y + fi * x;
        }
      }
    }
    for (let i = n - 1; i >= 0; i--) {
      const row = i * width;
      const a = re[row + i];
      const b = im[row + i];
      const inverse = 1 / (a * a + b * b);
      for (let c = n; c < width; c++) {
        let x = re[row + c];
        let y = im[row + c];
        for (let j = i + 1; j < n; j++) {
          const u = re[row + j];
          const v = im[row + j];
          const s = re[j * width + c];
          const t = im[j * width + c];
          x -= u * s - v * t;
          y -= u * t + v * s;
        }
        re[row + c] = (x * a + y * b) * inverse;
        im[row + c] = (y * a - x * b) * inverse;
      }
    }
    const last = (n - 1) * width;
    out.s11.re[p] = -1 + 2 * im[n];
    out.s11.im[p] = -2 * re[n];
    const tr = 2 * im[last + n];
    const ti = -2 * re[last + n];
    out.s21.re[p] = tr;
    out.s21.im[p] = ti;
    out.s22.re[p] = -1 + 2 * im[last + n + 1];
    out.s22.im[p] = -2 * re[last + n + 1];
    let x = 0;
    let y = 0;
    for (let i = 1; i < n - 1; i++) {
      const row = i * width;
      x += re[row + n] * re[row + n + 1] - im[row + n] * im[row + n + 1];
      y += re[row + n] * im[row + n + 1] + im[row + n] * re[row + n + 1];
    }
    out.groupDelay[p] = (-2 * (x * tr + y * ti)) / (tr * tr + ti * ti);
  }
  return out;
}
