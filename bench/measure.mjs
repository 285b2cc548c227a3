import { Bench } from 'tinybench';

/**
 * Times tasks in one process, interleaved by tinybench, and gives the p50 of each in milliseconds.
 *
 * @param {Record<string, () => unknown>} tasks what to run; each returns something, so that nothing is optimized away
 * @param {number} time milliseconds to spend on each task
 * @returns {Promise<Record<string, number>>}
 */
export async function medians(tasks, time = 1500) {
  const bench = new Bench({ time, warmupTime: 300, iterations: 12 });
  let kept = 0;
  for (const [name, task] of Object.entries(tasks)) {
    bench.add(name, () => {
      kept += task() === undefined ? 0 : 1;
    });
  }
  await bench.run();
  if (kept === 0) throw new Error('nothing ran');
  return Object.fromEntries(bench.tasks.map((task) => [task.name, task.result.latency.p50]));
}

/** A loop of fixed work (4e5 dependent multiply-adds) that other times are divided by: a yardstick of the machine. */
export function fixedLoop() {
  let x = 0.5;
  for (let i = 0; i < 400_000; i++) x = x * 0.9999999 + 1e-7;
  return x;
}
