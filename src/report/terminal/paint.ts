/** Emphasis of a text, as far as the place it goes to has any; each gives back its text, marked or as it was. */
export interface Paint {
  readonly strong: (text: string) => string;
  readonly dim: (text: string) => string;
  readonly alarm: (text: string) => string;
}

const same = (text: string): string => text;

/** No emphasis. */
export const PLAIN: Paint = { strong: same, dim: same, alarm: same };
