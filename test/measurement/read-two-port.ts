/** What an independent reader found in a two-port data file. */
export interface ReadTwoPort {
  readonly comments: readonly string[];
  readonly option: string;
  readonly records: readonly (readonly number[])[];
}

/** A small reader of the format, written for the tests from its grammar and not from the writer. */
export function readTwoPort(text: string): ReadTwoPort {
  const comments: string[] = [];
  const records: number[][] = [];
  let option = '';
  for (const line of text.split('\n')) {
    const mark = line.indexOf('!');
    if (mark >= 0) comments.push(line.slice(mark + 1).trim());
    const data = (mark >= 0 ? line.slice(0, mark) : line).trim();
    if (data === '') continue;
    if (data.startsWith('#')) {
      if (option !== '' || records.length > 0) throw new Error('option line out of place');
      option = data;
      continue;
    }
    const tokens = data.split(/[ \t]+/);
    if (tokens.length !== 9) throw new Error(`record of ${tokens.length} numbers`);
    records.push(
      tokens.map((token) => {
        if (!/^[+-]?(\d+(\.\d*)?|\.\d+)([eE][+-]?\d+)?$/.test(token)) throw new Error(`no number: ${token}`);
        return Number(token);
      }),
    );
  }
  return { comments, option, records };
}
