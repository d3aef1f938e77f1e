import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';
import { VitePWA } from 'vite-plugin-pwa';

/** The phone's photos on a page of their own, with the product's replica, kit and worker; no part of the product's build. */
export default defineConfig({
  root: import.meta.dirname,
  publicDir: false,
  plugins: [
    react(),
    tailwindcss(),
    VitePWA({
      strategies: 'injectManifest',
      srcDir: '../../../src',
      filename: 'sw.ts',
      injectRegister: false,
      injectManifest: { globPatterns: ['**/*.{js,css,html,woff2}'] },
      manifest: false,
    }),
  ],
  build: { emptyOutDir: true, assetsInlineLimit: 0 },
});
