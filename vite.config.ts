import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig, type Plugin } from 'vite';
import { VitePWA } from 'vite-plugin-pwa';

const JSON_SCHEMA_FILES = /zod\/v4\/core\/(to-json-schema|json-schema-processors)\.js$/;

/** Leaves out zod's writing of JSON Schema, which the server alone does: every schema names it, so that the phone would load 5 KB of it first. */
function withoutJsonSchema(): Plugin {
  return {
    name: 'without-json-schema',
    transform(code, id) {
      if (!JSON_SCHEMA_FILES.test(id)) return;
      const named = [...code.matchAll(/^export (?:const|function) (\w+)/gm)].map(([, name]) => name);
      const absent = "() => { throw new Error('JSON Schema is written by the server alone.'); }";
      const exports = [...named.map((name) => `${name} = absent`), 'process = absent'];
      return `const absent = ${absent};\nexport const ${exports.join(', ')};`;
    },
  };
}

export default defineConfig({
  plugins: [
    withoutJsonSchema(),
    react(),
    tailwindcss(),
    VitePWA({
      strategies: 'injectManifest',
      srcDir: 'src',
      filename: 'sw.ts',
      // src/app-update.ts registers the worker, so that a person chooses the moment of an update
      injectRegister: false,
      injectManifest: {
        globPatterns: ['**/*.{js,css,html,svg,png,woff2,wasm}'],
        maximumFileSizeToCacheInBytes: 4 * 1024 * 1024,
      },
      manifest: {
        id: '/',
        name: 'Ribband',
        short_name: 'Ribband',
        description: 'The day record of a wooden-boat restoration shop',
        lang: 'en',
        start_url: '/',
        scope: '/',
        display: 'standalone',
        background_color: '#EFF2F1',
        theme_color: '#0E1F24',
        icons: [
          { src: '/icons/icon-192.png', sizes: '192x192', type: 'image/png', purpose: 'any' },
          { src: '/icons/icon-512.png', sizes: '512x512', type: 'image/png', purpose: 'any' },
          { src: '/icons/maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
        ],
      },
    }),
  ],
  worker: { format: 'es' },
  // the content security policy lets no data: URL in but pictures', so nothing is inlined
  build: { outDir: 'dist', assetsInlineLimit: 0 },
  server: { host: '127.0.0.1', port: 5173, proxy: { '/api': 'http://127.0.0.1:5180' } },
});
