import { existsSync } from 'node:fs';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { LaunchFailure } from './failure.ts';

const WAIT_MAX_MS = 5000;
const LOOK_AGAIN_MS = 100;

/** Makes the data folder where it is missing, and claims it for this process. */
export async function claimDataFolder(dataDir: string): Promise<void> {
  // others may pass through to what is theirs (the postgres user to its cluster), and read nothing
  await mkdir(dataDir, { recursive: true, mode: 0o711 });
  const file = path.join(dataDir, 'server.pid');
  const giveUpAt = Date.now() + WAIT_MAX_MS;
  let holder = await livingHolder(file);
  while (holder !== null && Date.now() < giveUpAt) {
    await delay(LOOK_AGAIN_MS); // one that is just stopping
    holder = await livingHolder(file);
  }
  if (holder !== null) throw new LaunchFailure(`Ribband already runs on ${dataDir}, as process ${holder}.`);
  await writeFile(file, `${process.pid} ${await birthOf(process.pid)}`);
}

// the number alone may have passed to another process; with the moment of its birth it is never mistaken
async function livingHolder(file: string): Promise<number | null> {
  const [pid, birth] = (await readFile(file, 'utf8').catch(() => '')).split(' ');
  return pid && birth && (await birthOf(Number(pid))) === birth ? Number(pid) : null;
}

/** When the process began, in clock ticks since the machine did (Linux); 'unknown' where that cannot be read, null where it is gone. */
async function birthOf(pid: number): Promise<string | null> {
  if (!existsSync('/proc/self')) return isAlive(pid) ? 'unknown' : null;
  const stat = await readFile(`/proc/${pid}/stat`, 'utf8').catch(() => null);
  if (stat === null) return null;
  // the name, in brackets, may itself hold spaces; field 3 is the state (Z: dead, not yet buried), field 22 the start
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return fields[0] === 'Z' ? null : (fields[19] ?? null);
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
