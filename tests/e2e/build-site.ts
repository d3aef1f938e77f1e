import { execFile } from 'node:child_process';
import { resolve } from 'node:path';
import { promisify } from 'node:util';

const ROOT = resolve(import.meta.dirname, '../..');

/** Runs `vite build` into a folder, by the product's settings or others. */
export async function buildSite(outDir: string, configFile = resolve(ROOT, 'vite.config.ts')): Promise<void> {
  const vite = resolve(ROOT, 'node_modules/vite/bin/vite.js');
  const args = [
    vite,
    'build',
    '--config',
    configFile,
    '--outDir',
    outDir,
    '--emptyOutDir',
    '--logLevel',
    'error',
  ];
  // a process of its own: under a test runner NODE_ENV is 'test', and the build would be one for development
  await promisify(execFile)(process.execPath, args, {
    cwd: ROOT,
    env: { ...process.env, NODE_ENV: 'production' },
  });
}
