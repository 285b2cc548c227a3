import type { Specification } from '../../specification/index.js';
import { cleanLine } from '../words/clean-text.js';
import type { FrequencyUnit } from '../words/numbers.js';
import { bandText, familyText, levelText, qualityText, UNNAMED, zerosText } from '../words/title.js';
import { wrapped } from './layout.js';
import type { Paint } from './paint.js';

/** What the design is, in four lines. */
export function titleLines(specification: Specification, unit: FrequencyUnit, paint: Paint): readonly string[] {
  const { name, band, order, family, topology, unloadedQ } = specification;
  const zeros = zerosText(specification, unit);
  // Of the equiripple families the zeros below say which it is.
  const kind = /chebyshev/i.test(family) && family !== 'inverseChebyshev' ? '' : `${familyText(family)}, `;
  return [
    ...wrapped(cleanLine(name ?? UNNAMED)).map(paint.strong),
    ...wrapped(bandText(band, unit)),
    ...wrapped(`Order ${order}, ${topology}, ${kind}${levelText(specification)}, ${qualityText(unloadedQ)}`),
    ...wrapped(zeros),
  ];
}
