/** Names of the commands, in the order in which they are told. */
export const COMMANDS = ['design', 'analyze', 'rotate', 'schema'] as const;

/** Name of a command. */
export type CommandName = (typeof COMMANDS)[number];

/** Help of the program. */
export const PROGRAM_HELP = `irisloom: from the specification of a microwave bandpass filter to a certified
coupling matrix and the numbers that hardware is made from.

  irisloom design FILE     design the filter that a design file asks for
  irisloom analyze FILE    look at a coupling matrix that you already have
  irisloom rotate FILE     replay a sequence of rotations on a coupling matrix
  irisloom schema          print the JSON Schema of a design file, for editors

  irisloom COMMAND --help  what a command takes and gives
  irisloom --version       the version

Exit status: 0 done, 2 input or command line not understood, 3 a certificate
does not hold, 4 trouble with a file, 70 a fault of irisloom, 130 interrupted.
Messages say what was found, what is allowed, and what to do.
`;

const DESIGN_HELP = `irisloom design FILE [--out FOLDER] [--overwrite]

Reads one design file (JSON), designs and certifies the filter, writes a folder
with the results, and prints a summary. When anything is wrong, nothing is
written.

  --out FOLDER   where the results go; without it, a folder beside the file:
                 larkmoor.json gives larkmoor-design
  --overwrite    replace results in a folder that another design file, or
                 nobody, wrote. A folder that the same design file wrote before
                 is replaced without it. Other files in the folder stay.

Design file, the least:
  { "passband": { "lowerHz": "3822 MHz", "upperHz": "3858 MHz" },
    "order": 6, "returnLossDb": 22 }
Further keys: name, notes, revision, date, family, transmissionZeros, topology,
portCouplings, unloadedQ, mask, sweep; with some families rejectionDb,
stopBandEdge, largestPairAtInfinity, reflectionSide. Frequencies are text with
a unit or numbers of hertz.
"irisloom schema" describes every key.

Results:
  report.html    everything for people: verdict, pictures, tables, evidence; one
                 file that opens and prints without a network
  report.md      the same as Markdown, with links to the pictures
  *.svg          the pictures, one file each
  result.json    everything, every digit, with the version, the design file and
                 its SHA-256 digest
  matrix.csv     the coupling matrix
  hand-over.csv  resonators, couplings, external Q
  response.s2p   the predicted response with loss, a Touchstone two-port file
`;

const ANALYZE_HELP = `irisloom analyze FILE [--json]

Reads a coupling matrix and prints what it is and does: response, certificates,
and with a passband the hand-over numbers and the verdict on a mask.

  --json         print JSON instead of text

Keys of the file:
  matrix         (N+2) rows of (N+2) numbers: source, resonators, load; or an
                 object with order and values. Needed; all others may be left
                 out.
  name, notes    free text
  passband       as in a design file; then frequencies are in hertz
  unloadedQ      as in a design file; needs the passband
  mask           as in a design file; needs the passband
  order, returnLossDb, transmissionZeros, family, topology
                 as in a design file: the response that the matrix should have
A result.json that "irisloom design" wrote is accepted as it is.

Where the file states a response (a return loss, or a family without one), the
matrix is certified against it, to 1e-9. The analysis is printed in any case; if
a certificate fails, the exit status is 3. A matrix rounded to four decimals
fails: state no response to look at it for its own sake.
`;

const ROTATE_HELP = `irisloom rotate FILE [--json]

Replays a sequence of plane rotations on a coupling matrix. For each step it
prints the pivot, the angle, the entry made zero and its value before, the
largest entry left outside the target pattern, and the drift of what rotations
must keep; then the matrix at the end.

  --json         print JSON instead of text

Keys of the file:
  matrix         as for "irisloom analyze"; or instead of it
  response       order, returnLossDb, transmissionZeros (and family, passband)
                 as in a design file: starts from the transversal matrix
  steps          list of { "pivot": [i, j], "angleDegrees": a }
                      or { "pivot": [i, j], "annihilate": [k, l] }
  pattern        "folded", "arrow", or a list of pairs [i, j] that may couple
  name, notes    free text
Nodes: 0 source, 1 to N resonators, N+1 load. Pivots are resonators. The new
row i is cos(a) times row i less sin(a) times row j.
`;

const SCHEMA_HELP = `irisloom schema

Prints the JSON Schema (draft 2020-12) of a design file: give it to an editor,
and it completes and explains the keys.
`;

/** Help of one command. */
export const COMMAND_HELP: Readonly<Record<CommandName, string>> = {
  design: DESIGN_HELP,
  analyze: ANALYZE_HELP,
  rotate: ROTATE_HELP,
  schema: SCHEMA_HELP,
};
