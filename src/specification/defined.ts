/** The same object without its undefined fields. */
export function definedOnly<T extends object>(value: T): { [Key in keyof T]?: Exclude<T[Key], undefined> } {
  const entries = Object.entries(value).filter(([, field]) => field !== undefined);
  return Object.fromEntries(entries) as { [Key in keyof T]?: Exclude<T[Key], undefined> };
}

/** Freezes plain data all the way down; gives it back. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    Object.values(value).forEach(deepFreeze);
  }
  return value;
}
