import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { chmod, mkdtemp, readFile, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { freePort } from '#server/launch/free-port.ts';

const projectDir = path.resolve(fileURLToPath(import.meta.url), '../../..');

export type DataFolder = { path: string; remove: () => Promise<void> };

/** A fresh data folder that the postgres user can enter. */
export async function makeDataFolder(): Promise<DataFolder> {
  const folder = await mkdtemp(path.join(os.tmpdir(), 'ribband-launch-'));
  await chmod(folder, 0o711);
  return { path: path.join(folder, 'data'), remove: () => rm(folder, { recursive: true, force: true }) };
}

export type Launched = {
  url: string;
  /** what it has printed so far */
  lines: string[];
  /** the first line that fits, as soon as it is printed */
  says: (pattern: RegExp) => Promise<string>;
  npmPid: number;
  serverPid: () => Promise<number>;
  postgresPid: () => Promise<number>;
  kill: (signal: NodeJS.Signals) => void;
  exited: Promise<unknown>;
};

/** The real `npm start`, once it says that it is ready; rejects with what it printed if it ends before. */
export async function launch(dataDir: string, variables: Record<string, string> = {}): Promise<Launched> {
  const { PATH, HOME } = process.env;
  const env = {
    PATH,
    HOME,
    HOST: '127.0.0.1',
    PORT: String(await freePort()),
    RIBBAND_DATA: dataDir,
    ...variables,
  };
  const npm = spawn('npm', ['start'], { cwd: projectDir, env, stdio: ['ignore', 'pipe', 'pipe'] });
  const exited = once(npm, 'close'); // 'exit' may come before the last lines
  const lines: string[] = [];
  npm.stderr.on('data', (part) => lines.push(String(part)));
  const output = createInterface(npm.stdout).on('line', (line) => lines.push(line));
  const says = (pattern: RegExp) =>
    new Promise<string>((resolve, reject) => {
      const look = () => {
        const found = lines.find((line) => pattern.test(line));
        if (found !== undefined) resolve(found);
      };
      look();
      output.on('line', look);
      void exited.then(() => reject(new Error(`npm start ended:\n${lines.join('\n')}`)));
    });
  const ready = await says(/^Ribband is ready at /);
  const pidIn = async (file: string) => Number.parseInt(await readFile(path.join(dataDir, file), 'utf8'), 10);
  return {
    url: ready.split(' ').at(-1)!,
    lines,
    says,
    npmPid: npm.pid!,
    serverPid: () => pidIn('server.pid'),
    postgresPid: () => pidIn('postgres/postmaster.pid'),
    kill: (signal) => void npm.kill(signal),
    exited,
  };
}

/** True while the process is there; one that is dead and not yet buried is not. */
export async function isRunning(pid: number): Promise<boolean> {
  if (!existsSync(`/proc/${pid}`)) return false;
  const stat = await readFile(`/proc/${pid}/stat`, 'utf8').catch(() => null);
  return stat !== null && !stat.slice(stat.lastIndexOf(')') + 2).startsWith('Z');
}
