import { echo } from './echo.js';
import type { Fault } from './faults.js';

/** What a date may be: a day that the calendar has, in the extended form of ISO 8601 (years before 1583 need an agreement). */
export const DATE_ALLOWED = 'a day of the calendar as YYYY-MM-DD, from 1583 on';

const FORM = /^(\d{4})-(\d{2})-(\d{2})$/;
const FIRST_YEAR = 1583;
const DAYS: readonly number[] = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

function daysIn(year: number, month: number): number {
  const isLeap = year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
  return (DAYS[month - 1] ?? 0) + (month === 2 && isLeap ? 1 : 0);
}

/** The fault of a date, if it has one. */
export function dateFault(date: string): Fault | undefined {
  const [, year, month, day] = (FORM.exec(date) ?? []).map(Number);
  const base = { code: 'E_DATE', path: ['date'], found: echo(date), allowed: DATE_ALLOWED, value: date.slice(0, 40) };
  if (year === undefined || month === undefined || day === undefined) {
    return { ...base, advice: 'write it like "2026-12-01"' };
  }
  const last = daysIn(year, month);
  if (year >= FIRST_YEAR && day >= 1 && day <= last) return undefined;
  const advice =
    last === 0 ? 'months are 01 to 12' : year < FIRST_YEAR ? 'check the year' : `that month has ${last} days`;
  return { ...base, advice };
}
