import type { World } from './world.js';

/** Silence until then, milliseconds. */
const PATIENCE = 500;

/** Tells, on a terminal only, what is being done when a run takes long. */
export interface Progress {
  readonly step: (doing: string) => void;
  /** Clears what was told. */
  readonly end: () => void;
}

/** Progress on standard error, which stays empty where it is no terminal or nothing takes long. */
export function progressOf({ stderr, now }: World): Progress {
  const start = now();
  let shown = 0;
  const say = (text: string): void => {
    stderr.write(`\r${text.padEnd(shown)}`);
    shown = text.length;
  };
  return {
    step: (doing) => {
      if (stderr.isTerminal && now() - start > PATIENCE) say(`${doing} ...`);
    },
    end: () => {
      if (shown > 0) stderr.write(`\r${' '.repeat(shown)}\r`);
      shown = 0;
    },
  };
}
