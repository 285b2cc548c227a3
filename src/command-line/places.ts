import { FilterFailure } from '../numerics/index.js';
import { type JsonText, type Path, pathText } from '../specification/index.js';

/** `mask[0].fromHz` back into its steps; quoted keys do not occur in what is checked here. */
function stepsOf(argument: string): Path {
  return (argument.match(/[^.[\]]+/g) ?? []).map((step) => (/^\d+$/.test(step) ? Number(step) : step));
}

function placed(failure: FilterFailure, positionOf: JsonText['positionOf'], before: Path): FilterFailure {
  const { code, argument, message } = failure;
  const head = `${code} ${argument ?? ''}`;
  if (argument === undefined || !message.startsWith(`${head}:`)) return failure;
  const path = [...before, ...stepsOf(argument)];
  const { line, column } = positionOf(path, code === 'E_UNKNOWN_KEY');
  const name = pathText(path);
  const text = `${code} ${name} (${line}:${column})${message.slice(head.length)}`;
  return new FilterFailure(code, text, {
    argument: name,
    value: failure.value,
    limit: failure.limit,
    ...(failure.hint === undefined ? {} : { hint: failure.hint }),
  });
}

/** The single faults of whatever was thrown; undefined when it is no refusal. */
function faultsIn(error: unknown): readonly FilterFailure[] | undefined {
  if (!(error instanceof FilterFailure)) return undefined;
  return error.faults.length > 0 ? error.faults : [error];
}

/**
 * Runs a check that knows nothing of the text its value came from, and adds the places in that text to its refusals;
 * `before` leads from the root of the text to the value checked.
 */
export function locating<Result>(
  positionOf: JsonText['positionOf'],
  before: Path,
  faults: FilterFailure[],
  check: () => Result,
): Result | undefined {
  try {
    return check();
  } catch (error) {
    const found = faultsIn(error);
    if (found === undefined) throw error;
    faults.push(...found.map((fault) => placed(fault, positionOf, before)));
    return undefined;
  }
}

const FAULT_LIMIT = 20;

/** Leaves out a missing key where an unknown one was meant as it. */
function withoutMisspelled(faults: readonly FilterFailure[]): readonly FilterFailure[] {
  const meant = faults.filter(({ code }) => code === 'E_UNKNOWN_KEY').map(({ limit }) => limit);
  const nameOf = ({ argument = '' }: FilterFailure): string | undefined => argument.split('.').at(-1);
  return faults.filter((fault) => fault.code !== 'E_MISSING' || !meant.includes(nameOf(fault)));
}

/** Throws one refusal for all faults, or returns when there are none. */
export function refuseAll(all: readonly FilterFailure[]): void {
  const faults = withoutMisspelled(all);
  const [first, second] = faults;
  if (first === undefined) return;
  if (second === undefined) throw first;
  const shown = faults.slice(0, FAULT_LIMIT);
  const lines = shown.map(({ message }) => message);
  if (faults.length > shown.length) lines.push(`(${faults.length - shown.length} more faults not listed)`);
  throw new FilterFailure(first.code, lines.join('\n'), { faults: shown, value: first.value, limit: first.limit });
}
