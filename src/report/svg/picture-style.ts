import { DARK, LIGHT, type Palette, type Role } from './palette.js';

/** Font of tables and pictures: what the reader's system has. */
export const FONT = 'ui-sans-serif,system-ui,"Segoe UI","Helvetica Neue","Noto Sans","DejaVu Sans",sans-serif';

/**
 * The rules that drawings are drawn by. Drawings carry classes only: a document gives the colors as variables, a file of
 * its own as they are, since not every program that shows SVG knows variables.
 */
export function pictureRules(color: (role: Role) => string): string {
  const colors = ['ink', 'second', 'hairline', 'transmission', 'reflection', 'negative', 'short', 'hatch'] as const;
  return [
    `.pic{font-family:${FONT};font-variant-numeric:tabular-nums lining-nums}`,
    `.pic text{font-size:13px;fill:${color('ink')};stroke:none}`,
    `.pic .tick{font-size:12.5px;fill:${color('second')}}`,
    `.pic .small{font-size:11px}`,
    `.pic .bold{font-weight:700}`,
    `.pic .mid{text-anchor:middle}`,
    `.pic .end{text-anchor:end}`,
    // A label over a curve or a hatch has a rim in the color of its ground; the letters lie above it.
    `.pic .halo{paint-order:stroke;stroke:${color('window')};stroke-width:4px;stroke-linejoin:round}`,
    `.pic .halo-ground{paint-order:stroke;stroke:${color('ground')};stroke-width:4px;stroke-linejoin:round}`,
    ...colors.map((role) => `.pic .f-${role},.pic text.f-${role}{fill:${color(role)}}`),
    ...(['paper', 'window', 'ground'] as const).map((role) => `.pic .f-${role}{fill:${color(role)}}`),
    ...colors.map((role) => `.pic .s-${role}{stroke:${color(role)}}`),
    `.pic .s-paper{stroke:${color('paper')}}`,
    `.pic .s-window{stroke:${color('window')}}`,
    `.pic .line{fill:none;stroke-linejoin:round;stroke-linecap:butt}`,
    `.pic .thick{stroke-width:2.8px}`,
    `.pic .medium{stroke-width:1.7px}`,
    `.pic .edge{stroke-width:1.5px}`,
    `.pic .thin{stroke-width:.9px}`,
    `.pic .hair{stroke-width:1px}`,
    `.pic .dash{stroke-dasharray:7 4}`,
    `.pic .dots{stroke-dasharray:0 3.4;stroke-linecap:round;stroke-width:1.3px}`,
    `.pic .half{stroke-opacity:.5}`,
  ].join('\n');
}

function literal(palette: Palette): string {
  return pictureRules((role) => palette[role]);
}

/** The whole style of a drawing that is a file of its own. */
export const FILE_STYLE: string = `${literal(LIGHT)}\n@media (prefers-color-scheme:dark){\n${literal(DARK)}\n}`;
