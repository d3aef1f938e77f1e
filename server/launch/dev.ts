import { spawn } from 'node:child_process';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

// For work on the code: the server restarts when a file of it changes, and Vite serves the front end at
// http://127.0.0.1:5173 and passes /api on to the server.
const projectDir = path.resolve(fileURLToPath(import.meta.url), '../../..');
const node = (...args: string[]) => spawn(process.execPath, args, { cwd: projectDir, stdio: 'inherit' });

const children = [
  node(
    'node_modules/tsx/dist/cli.mjs',
    'watch',
    '--clear-screen=false',
    'server/launch/start.ts',
    '--api-only',
  ),
  node('node_modules/vite/bin/vite.js'),
];

let isStopping = false;
function stop(): void {
  if (isStopping) return; // a second signal makes the watcher kill the server hard
  isStopping = true;
  for (const child of children) child.kill('SIGTERM');
}
for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP'] as const) process.on(signal, stop);
for (const child of children) child.once('exit', stop);
