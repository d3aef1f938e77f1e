/** Hours of work as people write and read them. The record keeps whole minutes. */

export const MINUTES_PER_ENTRY_MAX = 24 * 60;

const FRACTION_SIGNS: Record<string, string> = { '¼': ' 1/4', '½': ' 1/2', '¾': ' 3/4' };

/**
 * Minutes from what a person typed: `2.5`, `2,5`, `2 1/2`, `2½`, `2:30`, `2 h 30`, `45 min`.
 * Null where it is none of these, or more than a day.
 */
export function parseHours(text: string): number | null {
  const plain = normalise(text);
  const minutes = fromClock(plain) ?? fromMinutes(plain) ?? fromDecimal(plain) ?? fromFraction(plain);
  if (minutes === null || minutes > MINUTES_PER_ENTRY_MAX) return null;
  return minutes;
}

function normalise(text: string): string {
  return text
    .toLowerCase()
    .replace(/[¼½¾]/g, (sign) => FRACTION_SIGNS[sign] ?? sign)
    .replace(',', '.')
    .trim()
    .replace(/\s*(?:h|hrs?|hours?)$/, '');
}

function fromClock(text: string): number | null {
  const match = /^(\d{1,2})\s*(?::|h|hrs?|hours?)\s*([0-5]\d)(?:\s*(?:m|mins?|minutes?))?$/.exec(text);
  return match ? Number(match[1]) * 60 + Number(match[2]) : null;
}

function fromMinutes(text: string): number | null {
  const match = /^(\d{1,4})\s*(?:m|mins?|minutes?)$/.exec(text);
  return match ? Number(match[1]) : null;
}

function fromDecimal(text: string): number | null {
  return /^(?:\d{1,2}(?:\.\d{0,4})?|\.\d{1,4})$/.test(text) ? Math.round(Number(text) * 60) : null;
}

function fromFraction(text: string): number | null {
  const match = /^(?:(\d{1,2})[\s-]+)?(\d{1,2})\/(\d{1,2})$/.exec(text);
  if (!match) return null;
  const [whole, top, bottom] = [Number(match[1] ?? 0), Number(match[2]), Number(match[3])];
  if (bottom === 0 || top >= bottom) return null;
  return Math.round((whole + top / bottom) * 60);
}

/** Hours taken apart for the eye: `2`, `1/2`. `oddMinutes` is set where no quarter hour fits, and then there is no fraction. */
export interface WrittenHours {
  whole: number;
  fraction: '1/4' | '1/2' | '3/4' | null;
  oddMinutes: number;
}

const FRACTION_BY_MINUTES = { 15: '1/4', 30: '1/2', 45: '3/4' } as const;

/** Takes whole minutes, zero or more, apart into hours and a fraction. */
export function formatHours(minutes: number): WrittenHours {
  const rest = minutes % 60;
  const whole = (minutes - rest) / 60;
  if (rest === 15 || rest === 30 || rest === 45)
    return { whole, fraction: FRACTION_BY_MINUTES[rest], oddMinutes: 0 };
  return { whole, fraction: null, oddMinutes: rest };
}

/** Hours as plain text (`2 1/2`, `1/2`, `2:20`), in a form that `parseHours` reads back to the same minutes. */
export function hoursText(minutes: number): string {
  const { whole, fraction, oddMinutes } = formatHours(minutes);
  if (oddMinutes > 0) return `${whole}:${String(oddMinutes).padStart(2, '0')}`;
  if (fraction === null) return String(whole);
  return whole === 0 ? fraction : `${whole} ${fraction}`;
}
