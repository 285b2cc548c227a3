import fc from 'fast-check';
import type { Engine } from './engine.js';
import type { Fault } from './faults.js';

/** A property of an engine, with faults under which it must fail. */
export interface Law {
  readonly name: string;
  readonly runs: number;
  readonly property: (engine: Engine) => fc.IProperty<[unknown]>;
  readonly faults: readonly (readonly [string, Fault])[];
}

/** A law over one arbitrary; `holds` throws where the law does not hold. */
export function law<T>(
  name: string,
  arbitrary: fc.Arbitrary<T>,
  holds: (engine: Engine, sample: T) => void,
  faults: readonly (readonly [string, Fault])[],
  runs = 60,
): Law {
  const property = (engine: Engine): fc.IProperty<[unknown]> =>
    fc.property(arbitrary, (sample) => holds(engine, sample)) as unknown as fc.IProperty<[unknown]>;
  return { name, runs, property, faults };
}

/** Throws unless `value <= limit` (NaN fails). */
export function within(value: number, limit: number, what: string): void {
  if (!(value <= limit)) throw new Error(`${what}: ${value} exceeds ${limit}`);
}

/** Throws unless the statement is true. */
export function must(holds: boolean, what: string): void {
  if (!holds) throw new Error(what);
}
