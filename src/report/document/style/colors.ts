import { DARK, LIGHT, type Palette, PRINT, ROLES } from '../../svg/palette.js';

function variables(palette: Palette): string {
  return `:root{${ROLES.map((role) => `--${role}:${palette[role]}`).join(';')}}`;
}

/** Colors by role: light, dark where the reader asks for it, and print on white whatever the screen shows. */
export const COLORS: string = [
  ':root{color-scheme:light dark}',
  variables(LIGHT),
  `@media (prefers-color-scheme:dark){${variables(DARK)}}`,
  `@media print{:root{color-scheme:light}${variables(PRINT)}}`,
].join('\n');
