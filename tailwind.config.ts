import plugin from 'tailwindcss/plugin';
import { cssVariables, themeColours } from './src/tokens.ts';

export default {
  content: [],
  theme: {
    extend: {
      colors: themeColours(),
      fontFamily: { sans: ['"Source Sans 3"', 'system-ui', 'sans-serif'] },
      borderRadius: { key: '3px' },
      spacing: { seam: '3px', key: '56px' },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ':root': { ...cssVariables('light'), 'color-scheme': 'light' },
        '@media (prefers-color-scheme: dark)': {
          ':root': { ...cssVariables('dark'), 'color-scheme': 'dark' },
        },
        '@media (prefers-contrast: more)': {
          ':root': { ...cssVariables('sunlight'), 'color-scheme': 'light' },
        },
        ':root[data-set=light]': { ...cssVariables('light'), 'color-scheme': 'light' },
        ':root[data-set=dark]': { ...cssVariables('dark'), 'color-scheme': 'dark' },
        ':root[data-set=sunlight]': { ...cssVariables('sunlight'), 'color-scheme': 'light' },
        '@media print': {
          ':root, :root[data-set]': { ...cssVariables('sunlight'), 'color-scheme': 'light' },
        },
      });
    }),
  ],
};
