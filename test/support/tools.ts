import { spawnSync } from 'node:child_process';

/** Debian's Python with mpmath; tests that need it are skipped on a machine without, and `.ci/run` fails on such a skip. */
export function hasMpmath(): boolean {
  return spawnSync('/usr/bin/python3', ['-c', 'import mpmath'], { stdio: 'ignore' }).status === 0;
}
