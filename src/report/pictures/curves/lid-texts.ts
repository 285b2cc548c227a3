import { requirementOf } from '../../words/requirement.js';
import { textSize } from './curve-name.js';
import { type Box, claim, type LabelMap } from './label-map.js';
import { type AskedLid, type Lid, lidBox } from './lids.js';
import { limitWords, roomText } from './limit-words.js';
import type { Plot } from './plot.js';
import type { PlacedText } from './walls.js';

/** How far from its lid a text may stand, pixels. */
const LIFTS: readonly number[] = [4, 16, 30, 46, 64];

/** Places for a text by a lid, best first: at the side of a limit at one frequency, on the free side of a limit over a span. */
function placesBeside(
  { fromHz, toHz, side }: Lid,
  box: Box,
  [width, height]: readonly [number, number],
): readonly Box[] {
  const at = (left: number, top: number): Box => ({ left, right: left + width, top, bottom: top + height });
  const middle = (box.left + box.right) / 2 - width / 2;
  if (fromHz === toHz) {
    const level = (box.top + box.bottom - height) / 2;
    const shifts = [0, 14, -14, 28, -28];
    return shifts.flatMap((down) => [at(box.right + 8, level + down), at(box.left - 8 - width, level + down)]);
  }
  const lefts = [middle, box.left, box.right - width];
  return LIFTS.flatMap((lift) => {
    const tops = side === 'above' ? [box.top - lift - height] : [box.bottom + lift, box.top - lift - height];
    return tops.flatMap((top) => lefts.map((left) => at(left, top)));
  });
}

/** What each lid asks and how much room is left, beside it where nothing is in the way: the most words that fit. */
export function lidTexts(map: LabelMap, plot: Plot, lids: readonly AskedLid[], asks: string): readonly PlacedText[] {
  return lids.flatMap(({ lid, row }) => {
    const requirement = requirementOf(row, plot.unit);
    const { limit, isMet } = requirement;
    const level = limitWords(limit);
    const [asked, room] = [`${asks} ${level} dB`, roomText(requirement)];
    const sign = asks.slice(-1);
    const box = lidBox(plot, lid);
    const wordings = [
      [asked, room],
      [`${asked}, ${room}`],
      [asked],
      [`${sign} ${level} dB`, room],
      [`${sign} ${level} dB, ${room}`],
      [`${sign} ${level} dB${isMet ? '' : `, ${roomText(requirement).split(' ').at(-1)}`}`],
    ];
    for (const lines of wordings)
      for (const place of placesBeside(lid, box, textSize(lines))) {
        if (claim(map, place)) return [{ box: place, lines, isMet }];
      }
    return [];
  });
}
