/** What a color stands for. Code names roles; hues stand here only. */
export type Role =
  | 'paper'
  | 'window'
  | 'ground'
  | 'ink'
  | 'second'
  | 'hairline'
  | 'transmission'
  | 'reflection'
  | 'negative'
  | 'short'
  | 'hatch';

/** Colors of one surface. */
export type Palette = Readonly<Record<Role, string>>;

/** Text keeps a contrast of 4.5 and marks one of 3 against paper, window and ground of the same palette (tested). */
export const LIGHT: Palette = {
  paper: '#F6F5F9',
  window: '#FFFFFF',
  ground: '#E9E6F0',
  ink: '#1C1828',
  second: '#57516A',
  hairline: '#D3CFDD',
  transmission: '#4B2A99',
  reflection: '#9A5200',
  negative: '#00706B',
  short: '#B4003F',
  hatch: '#827C93',
};

/** Plum paper, not black. */
export const DARK: Palette = {
  paper: '#26212F',
  window: '#3A3347',
  ground: '#2B2536',
  ink: '#F1EEF6',
  second: '#C2BBCF',
  hairline: '#544C63',
  transmission: '#C9B8FA',
  reflection: '#E0A75F',
  negative: '#86D3C8',
  short: '#FF9DB0',
  hatch: '#8F87A0',
};

/** White paper; needs no background to be understood. */
export const PRINT: Palette = {
  paper: '#FFFFFF',
  window: '#FFFFFF',
  ground: '#EFEFEF',
  ink: '#000000',
  second: '#3D3D3D',
  hairline: '#BDBDBD',
  transmission: '#2E1769',
  reflection: '#95540A',
  negative: '#00544F',
  short: '#9A0036',
  hatch: '#6E6E6E',
};

/** All roles in a fixed order. */
export const ROLES: readonly Role[] = Object.keys(LIGHT) as Role[];
