/** The colours of the app: one source for the Tailwind theme and for the contrast check. */

export type ColourSet = 'light' | 'dark' | 'sunlight';

/** What a token is for; the `on-` tokens are the ink on the ground of the same name. */
export type Token =
  | 'bilge'
  | 'slate'
  | 'primer'
  | 'plank'
  | 'verdigris'
  | 'on-verdigris'
  | 'mahogany'
  | 'coaming'
  | 'on-coaming'
  | 'seam'
  | 'on-seam'
  | 'redlead'
  | 'on-redlead'
  | 'deep'
  | 'on-deep'
  | 'line';

export const TOKENS: Record<ColourSet, Record<Token, string>> = {
  light: {
    bilge: '#0E1F24',
    slate: '#42545B',
    primer: '#EFF2F1',
    plank: '#FFFFFF',
    verdigris: '#095B52',
    'on-verdigris': '#FFFFFF',
    mahogany: '#6B2A1A',
    coaming: '#6B2A1A',
    'on-coaming': '#FFFFFF',
    seam: '#E8B63F',
    'on-seam': '#0E1F24',
    redlead: '#942B1B',
    'on-redlead': '#FFFFFF',
    deep: '#0E1F24',
    'on-deep': '#FFFFFF',
    line: '#C4CDCB',
  },
  dark: {
    bilge: '#E9EFED',
    slate: '#B3C1C3',
    primer: '#0A1417',
    plank: '#17262B',
    verdigris: '#7BD2C2',
    'on-verdigris': '#06201C',
    mahogany: '#F0B79F',
    coaming: '#4E1D11',
    'on-coaming': '#FFF4EE',
    seam: '#E8B63F',
    'on-seam': '#0E1F24',
    redlead: '#FFB0A0',
    'on-redlead': '#2A0A05',
    deep: '#050B0D',
    'on-deep': '#E9EFED',
    line: '#33464C',
  },
  sunlight: {
    bilge: '#000000',
    slate: '#000000',
    primer: '#FFFFFF',
    plank: '#FFFFFF',
    verdigris: '#000000',
    'on-verdigris': '#FFFFFF',
    mahogany: '#000000',
    coaming: '#000000',
    'on-coaming': '#FFFFFF',
    seam: '#FFFFFF',
    'on-seam': '#000000',
    redlead: '#000000',
    'on-redlead': '#FFFFFF',
    deep: '#000000',
    'on-deep': '#FFFFFF',
    line: '#000000',
  },
};

/** The tokens of one set as CSS custom properties (`--bilge` and so on). */
export function cssVariables(set: ColourSet): Record<string, string> {
  return Object.fromEntries(Object.entries(TOKENS[set]).map(([token, colour]) => [`--${token}`, colour]));
}

/** Each token as a Tailwind colour that follows the set in force. */
export function themeColours(): Record<Token, string> {
  const tokens = Object.keys(TOKENS.light) as Token[];
  return Object.fromEntries(tokens.map((token) => [token, `var(--${token})`])) as Record<Token, string>;
}
