import { existsSync } from 'node:fs';
import { readFile, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { run } from '#server/launch/command.ts';
import { LaunchFailure } from '#server/launch/failure.ts';
import { ensureFrontEnd } from '#server/launch/front-end.ts';
import { findPrograms, installPackages, isRoot } from '#server/launch/postgres-programs.ts';
import { orderlyStop } from '#server/launch/stopping.ts';
import { countsLine, countTests } from './worlds/counts.ts';
import type { RunnerReport } from './worlds/counts.ts';

// What `npm test` is: what the tests need, the two static checks, one run of all projects, and its figures last.
const projectDir = path.resolve(fileURLToPath(import.meta.url), '../..');
const chromium = '/usr/bin/chromium';

const stopping = orderlyStop();
const isClean = await prepare().catch((error: unknown) => {
  console.error(error instanceof LaunchFailure ? error.message : error);
  return false;
});
const counts = countTests(await runTests());
console.log(countsLine(counts));
await stopping.stop(isClean && counts.isSuccess ? 0 : 1);

async function prepare(): Promise<boolean> {
  await findPrograms(null);
  if (!existsSync(chromium) && isRoot()) await installPackages(['chromium']);
  const hasTypes = await tool('typescript7/bin/tsc', ['--noEmit']);
  const isLinted = await tool('eslint/bin/eslint.js', ['--max-warnings', '0', '.']);
  await ensureFrontEnd(projectDir);
  return hasTypes && isLinted;
}

async function runTests(): Promise<RunnerReport | null> {
  const file = path.join(os.tmpdir(), `ribband-counts-${process.pid}.json`);
  const only = process.argv.slice(2);
  await tool('vitest/vitest.mjs', [
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${file}`,
    ...only,
  ]);
  const text = await readFile(file, 'utf8').catch(() => null);
  await rm(file, { force: true });
  return text === null ? null : (JSON.parse(text) as RunnerReport);
}

async function tool(script: string, args: string[]): Promise<boolean> {
  const { code } = await run(process.execPath, [path.join('node_modules', script), ...args], {
    cwd: projectDir,
    output: 'show',
  });
  if (code !== 0) console.error(`${script} ended with ${code}`);
  return code === 0;
}
