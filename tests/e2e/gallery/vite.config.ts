import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';
import { VitePWA } from 'vite-plugin-pwa';

/** The kit on pages of its own, for the eye and for axe; no part of the product's build. */
export default defineConfig({
  root: import.meta.dirname,
  publicDir: false,
  plugins: [
    react(),
    tailwindcss(),
    // the product's own worker, registered by the update screen alone
    VitePWA({
      strategies: 'injectManifest',
      srcDir: '../../../src',
      filename: 'sw.ts',
      injectRegister: false,
      manifest: false,
    }),
  ],
  build: { emptyOutDir: true, assetsInlineLimit: 0 },
});
