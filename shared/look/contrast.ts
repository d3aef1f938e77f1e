/** WCAG 2.2 contrast, for sRGB colours written `#rrggbb`. */

/** The contrast ratio of two colours, 1 to 21, unrounded. */
export function contrastRatio(first: string, second: string): number {
  const [a, b] = [relativeLuminance(first), relativeLuminance(second)];
  return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

/** Relative luminance, 0 (black) to 1 (white). Throws where the colour is not written `#rrggbb`. */
export function relativeLuminance(colour: string): number {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(colour);
  if (!match) throw new Error(`not a colour written #rrggbb: ${colour}`);
  const [red, green, blue] = [linear(match[1]), linear(match[2]), linear(match[3])];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function linear(hexPair: string | undefined): number {
  const channel = Number.parseInt(hexPair ?? '', 16) / 255;
  return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
}
