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
