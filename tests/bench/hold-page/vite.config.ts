import { defineConfig } from 'vite';

/** The phone's own code on a page without screens; no part of the product's build. */
export default defineConfig({
  root: import.meta.dirname,
  publicDir: false,
  build: { emptyOutDir: true, assetsInlineLimit: 0 },
});
