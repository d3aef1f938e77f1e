/** Lengths of boats as people write and read them. The record keeps whole millimetres. */

export const INCH_MM = 25.4;
const FOOT_MM = 12 * INCH_MM;
const LENGTH_MM_MAX = 1_000_000;

export type Units = 'imperial' | 'metric';

/** A boat's length or beam: `26 ft`, `26 ft 6 in`, `7.92 m`. Inches are rounded to the nearest whole one. */
export function boatLengthText(mm: number, units: Units): string {
  if (units === 'metric') return `${Math.round(mm / 10) / 100} m`;
  const inches = Math.round(mm / INCH_MM);
  const [feet, rest] = [Math.floor(inches / 12), inches % 12];
  if (feet === 0) return `${rest} in`;
  return rest === 0 ? `${feet} ft` : `${feet} ft ${rest} in`;
}

/**
 * Millimetres from what a person typed: `26`, `26.5`, `26 ft 6 in`, `26'6"`, `7.92 m`, `7920 mm`. A bare figure is feet or
 * metres, as the shop has it. Null where it is none of these.
 */
export function parseBoatLength(text: string, units: Units): number | null {
  const plain = text.trim().toLowerCase().replace(',', '.');
  const mm = fromMetric(plain) ?? fromFeet(plain) ?? fromBare(plain, units);
  return mm === null || mm > LENGTH_MM_MAX ? null : Math.round(mm);
}

function fromMetric(text: string): number | null {
  const match = /^(\d+(?:\.\d+)?)\s*(mm|cm|m)$/.exec(text);
  if (!match) return null;
  return Number(match[1]) * { mm: 1, cm: 10, m: 1000 }[match[2] as 'mm' | 'cm' | 'm'];
}

function fromFeet(text: string): number | null {
  const inches = /^(\d+(?:\.\d+)?)\s*(?:in|inch|inches|")$/.exec(text);
  if (inches) return Number(inches[1]) * INCH_MM;
  const match =
    /^(\d+(?:\.\d+)?)\s*(?:ft|feet|foot|')\s*(?:(\d+(?:\.\d+)?)\s*(?:in|inch|inches|"|'')?)?$/.exec(text);
  return match ? Number(match[1]) * FOOT_MM + Number(match[2] ?? 0) * INCH_MM : null;
}

function fromBare(text: string, units: Units): number | null {
  if (!/^\d+(?:\.\d+)?$/.test(text)) return null;
  return Number(text) * (units === 'metric' ? 1000 : FOOT_MM);
}

const SIXTEENTH_MM = INCH_MM / 16;
const SIXTEENTHS_IN_FOOT = 12 * 16;
// above this, inches are counted out in feet
const INCHES_ALONE_MAX = 48;

/** A length as the bench writes it: whole inches and sixteenths. */
export interface Inches {
  whole: number;
  /** 0 to 15 */
  sixteenths: number;
}

/** The nearest sixteenth of an inch to a length in millimetres. */
export function inchesFromMm(mm: number): Inches {
  const all = Math.round(mm / SIXTEENTH_MM);
  return { whole: Math.floor(all / 16), sixteenths: all % 16 };
}

/** Whole millimetres; `inchesFromMm` gives the same inches back. */
export function mmFromInches({ whole, sixteenths }: Inches): number {
  return Math.round((whole * 16 + sixteenths) * SIXTEENTH_MM);
}

/** A length taken apart for the eye: '4 ft 2', '3/4', 'in'. */
export interface WrittenLength {
  whole: string;
  /** in its lowest terms; null where there is none */
  fraction: string | null;
  unit: string;
}

/** A length of a part: inches to the sixteenth, with feet above 48 of them, or millimetres. */
export function formatLength(mm: number, units: Units): WrittenLength {
  if (units === 'metric') return { whole: String(mm), fraction: null, unit: 'mm' };
  const { whole, sixteenths } = inchesFromMm(mm);
  const fraction = fractionText(sixteenths);
  if (whole <= INCHES_ALONE_MAX)
    return { whole: whole === 0 && fraction ? '' : String(whole), fraction, unit: 'in' };
  const feet = Math.floor((whole * 16) / SIXTEENTHS_IN_FOOT);
  return { whole: `${feet} ft ${whole % 12}`, fraction, unit: 'in' };
}

/** '11 3/4 in', '4 ft 2 in', '298 mm'. */
export function lengthText(mm: number, units: Units): string {
  const { whole, fraction, unit } = formatLength(mm, units);
  return [whole, fraction, unit].filter(Boolean).join(' ');
}

/** '3/4' of 12 sixteenths; null of none. */
export function fractionText(sixteenths: number): string | null {
  if (sixteenths === 0) return null;
  let [top, bottom] = [sixteenths, 16];
  while (top % 2 === 0) [top, bottom] = [top / 2, bottom / 2];
  return `${top}/${bottom}`;
}
