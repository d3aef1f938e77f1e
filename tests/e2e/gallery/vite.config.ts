import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

/** The kit on pages of its own, for the eye and for axe; no part of the product's build. */
export default defineConfig({
  root: import.meta.dirname,
  base: './',
  publicDir: false,
  plugins: [react(), tailwindcss()],
  build: { emptyOutDir: true, assetsInlineLimit: 0 },
});
