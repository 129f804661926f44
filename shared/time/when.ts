const MINUTE_MS = 60_000;
const JUST_NOW_MINUTES = 1;
const MINUTES_IN_WORDS = 60;

const CLOCK: Intl.DateTimeFormatOptions = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' };
const DAY: Intl.DateTimeFormatOptions = { weekday: 'short', day: 'numeric', month: 'short' };
const DAY_OF_YEAR: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'short', year: 'numeric' };
const LANGUAGE = 'en-GB';

function shown(at: Date, timeZone: string, form: Intl.DateTimeFormatOptions): string {
  return new Intl.DateTimeFormat(LANGUAGE, { ...form, timeZone }).format(at);
}

/**
 * Says when something was, as one says it.
 * @param at the moment
 * @param now the reader's present; a moment that lies a little after it, by an unequal clock, is "just now"
 * @param timeZone the reader's, as an IANA name
 * @returns "just now", "12 minutes ago", "today, 18:40", "yesterday, 18:40", "Fri 28 Nov" or "4 Nov 2023"
 * @example when(new Date('2026-03-01T10:00Z'), new Date('2026-03-01T10:12Z'), 'UTC') // '12 minutes ago'
 */
export function when(at: Date, now: Date, timeZone: string): string {
  const minutes = Math.floor((now.getTime() - at.getTime()) / MINUTE_MS);
  if (minutes < JUST_NOW_MINUTES) return 'just now';
  if (minutes === 1) return 'a minute ago';
  if (minutes < MINUTES_IN_WORDS) return `${minutes} minutes ago`;
  const day = (date: Date) => shown(date, timeZone, DAY_OF_YEAR);
  const yesterday = new Date(now);
  yesterday.setUTCDate(now.getUTCDate() - 1);
  if (day(at) === day(now)) return `today, ${shown(at, timeZone, CLOCK)}`;
  if (day(at) === day(yesterday)) return `yesterday, ${shown(at, timeZone, CLOCK)}`;
  const year = (date: Date) => shown(date, timeZone, { year: 'numeric' });
  return year(at) === year(now) ? shown(at, timeZone, DAY).replace(',', '') : day(at);
}
