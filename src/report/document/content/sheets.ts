import type { DesignReport } from '../../design-report.js';
import type { DesignSource } from '../../files/result-json.js';
import { unitOf } from '../../words/numbers.js';
import { type Block, type Sheet, type Stack, tableBlock } from './content.js';
import { assumptionBlock, certificateTable, conventionBlock, powerBlock, remarkBlocks } from './evidence.js';
import { couplingTable, portTable, resonatorTable, SIGN_SENTENCE } from './hand-over.js';
import { inputLists, inputTable } from './inputs.js';
import { maskPointTable } from './mask-points.js';
import { matrixTables } from './matrix-tables.js';
import { coefficientTable, rootTable } from './polynomials.js';

/** From this order on a matrix picture needs the whole width. */
const WIDE_MATRIX = 13;

function stack(shape: Stack['shape'], ...blocks: readonly Block[]): Stack {
  return { shape, blocks };
}

function picture(name: string): Block {
  return { kind: 'picture', name };
}

function bandSheet({ mask, specification }: DesignReport): Sheet {
  const unit = unitOf(specification.band);
  const points: readonly Stack[] =
    mask.length === 0 ? [] : [stack('wide', { kind: 'fold', table: maskPointTable(mask, unit) })];
  return {
    id: 'band-in-detail',
    head: 'Band in detail',
    stacks: [stack('half', picture('band')), stack('half', picture('group-delay')), ...points],
  };
}

function networkSheet({ matrix }: DesignReport): Sheet {
  const shape = matrix.order < WIDE_MATRIX ? 'half' : 'wide';
  return {
    id: 'network',
    head: 'Network',
    stacks: [
      stack('half', picture('routing')),
      stack(shape === 'half' ? 'tall' : 'half', picture('poles-zeros')),
      stack(shape, picture('matrix')),
      stack('wide', ...matrixTables(matrix).map(tableBlock)),
    ],
  };
}

function handOverSheet(design: DesignReport): Sheet {
  const unit = unitOf(design.specification.band);
  const couplings = couplingTable(design, unit);
  return {
    id: 'hand-over',
    head: 'Hand-over',
    stacks: [
      stack('half', ...(couplings.rows.length === 0 ? [] : [tableBlock(couplings)]), {
        kind: 'text',
        sentences: [SIGN_SENTENCE],
      }),
      stack('half', tableBlock(resonatorTable(design, unit)), tableBlock(portTable(design)), picture('resonators')),
    ],
  };
}

function evidenceSheet(design: DesignReport, source?: DesignSource): Sheet {
  const remarks = remarkBlocks(design);
  return {
    id: 'evidence',
    head: 'Evidence',
    stacks: [
      stack('half', tableBlock(certificateTable(design.certificates))),
      stack('half', conventionBlock(), assumptionBlock(design), powerBlock()),
      stack('half', tableBlock(rootTable(design))),
      stack('half', tableBlock(coefficientTable(design))),
      stack('wide', tableBlock(inputTable(design, source))),
      ...inputLists(design).map((table) => stack('half', tableBlock(table))),
      ...(remarks.length === 0 ? [] : [stack('wide', ...remarks)]),
    ],
  };
}

/** The sheets after the first page. */
export function sheetsOf(design: DesignReport, source?: DesignSource): readonly Sheet[] {
  return [bandSheet(design), networkSheet(design), handOverSheet(design), evidenceSheet(design, source)];
}
