import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { run } from './command.ts';
import { LaunchFailure } from './failure.ts';

const SOURCES = [
  'src',
  'shared',
  'public',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
];
const STAMP = '.sources';

/** Builds the front end into dist/ unless what is there was built from the very same sources. Returns dist's path. */
export async function ensureFrontEnd(projectDir: string): Promise<string> {
  const dist = path.join(projectDir, 'dist');
  const sources = await hashOf(projectDir);
  const builtFrom = await readFile(path.join(dist, STAMP), 'utf8').catch(() => null);
  if (builtFrom === sources) return dist;
  console.log('Building the front end ...');
  const fresh = `${dist}.new-${process.pid}`;
  await build(projectDir, fresh);
  await writeFile(path.join(fresh, STAMP), sources);
  await replace(dist, fresh);
  return dist;
}

async function build(projectDir: string, outDir: string): Promise<void> {
  const vite = path.join(projectDir, 'node_modules/vite/bin/vite.js');
  const args = [vite, 'build', '--outDir', outDir, '--emptyOutDir', '--logLevel', 'warn'];
  const { code, output } = await run(process.execPath, args, { cwd: projectDir });
  if (code === 0) return;
  await rm(outDir, { recursive: true, force: true });
  throw new LaunchFailure(`The front end cannot be built:\n${output}`);
}

// swapped in whole: a server that runs meanwhile never serves half a build, and two starts may build at once
async function replace(dist: string, fresh: string): Promise<void> {
  const old = `${dist}.old-${process.pid}`;
  for (;;) {
    if (existsSync(dist)) await rename(dist, old).catch(ignore('ENOENT'));
    const isDone = await rename(fresh, dist).then(() => true, ignore('ENOTEMPTY', 'EEXIST'));
    await rm(old, { recursive: true, force: true });
    if (isDone) return;
  }
}

function ignore(...codes: string[]): (error: NodeJS.ErrnoException) => false {
  return (error) => {
    if (codes.includes(error.code ?? '')) return false;
    throw error;
  };
}

async function hashOf(projectDir: string): Promise<string> {
  const hash = createHash('sha256');
  for (const file of (
    await Promise.all(SOURCES.map((name) => filesUnder(path.join(projectDir, name))))
  ).flat()) {
    hash.update(`${path.relative(projectDir, file)}\0`).update(await readFile(file));
  }
  return hash.digest('hex');
}

async function filesUnder(place: string): Promise<string[]> {
  if (!existsSync(place)) return [];
  const entries = await readdir(place, { recursive: true, withFileTypes: true }).catch(() => null);
  if (entries === null) return [place];
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath, entry.name))
    .sort();
}
