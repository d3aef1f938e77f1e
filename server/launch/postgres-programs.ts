import { existsSync } from 'node:fs';
import { mkdir, readdir, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { run } from './command.ts';
import { LaunchFailure } from './failure.ts';

const DEBIAN_DIR = '/usr/lib/postgresql';
const MAJOR_MIN = 15;

/** A folder with initdb, pg_ctl and postgres of one major version. */
export type Programs = { bin: string; major: number };

/** The PostgreSQL programs on this machine, installed first where that is needed and may be done. */
export async function findPrograms(wantedMajor: number | null): Promise<Programs> {
  const found = await present(wantedMajor);
  if (found) return found;
  const packageName = wantedMajor === null ? 'postgresql' : `postgresql-${wantedMajor}`;
  if (!isRoot() || !existsSync('/usr/bin/apt-get')) {
    throw new LaunchFailure(
      `PostgreSQL ${wantedMajor ?? `${MAJOR_MIN} or newer`} is missing. Run: sudo apt-get install -y ${packageName}   (or set DATABASE_URL)`,
    );
  }
  console.log('Installing PostgreSQL ...');
  await withoutPackagedCluster();
  await installPackages([packageName]);
  const installed = await present(wantedMajor);
  if (!installed)
    throw new LaunchFailure(
      `${packageName} was installed, but no PostgreSQL ${MAJOR_MIN} or newer came of it.`,
    );
  return installed;
}

/** Installs Debian packages; throws a LaunchFailure when apt-get does not manage. */
export async function installPackages(names: string[]): Promise<void> {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  for (const args of [
    ['update', '-q'],
    ['install', '-q', '-y', '--no-install-recommends', ...names],
  ]) {
    const { code } = await run('apt-get', args, { output: 'show', env });
    if (code !== 0) throw new LaunchFailure(`apt-get ${args.join(' ')} failed; see the lines above.`);
  }
}

export function isRoot(): boolean {
  return process.getuid?.() === 0;
}

// Debian's package otherwise makes and starts a cluster on 5432 that nobody asked for
async function withoutPackagedCluster(): Promise<void> {
  const settings = '/etc/postgresql-common/createcluster.conf';
  if (existsSync(settings)) return;
  await mkdir(path.dirname(settings), { recursive: true });
  await writeFile(settings, 'create_main_cluster = false\n');
}

async function present(wantedMajor: number | null): Promise<Programs | null> {
  const all = [...(await packaged()), ...(await onPath())].filter(({ major }) =>
    wantedMajor === null ? major >= MAJOR_MIN : major === wantedMajor,
  );
  return all.sort((a, b) => b.major - a.major)[0] ?? null;
}

async function packaged(): Promise<Programs[]> {
  const names = await readdir(DEBIAN_DIR).catch(() => []);
  return names
    .map((name) => ({ bin: path.join(DEBIAN_DIR, name, 'bin'), major: Number(name) }))
    .filter(({ bin }) => existsSync(path.join(bin, 'initdb')));
}

async function onPath(): Promise<Programs[]> {
  const folders = (process.env.PATH ?? '')
    .split(path.delimiter)
    .filter((folder) => existsSync(path.join(folder, 'initdb')));
  const found = await Promise.all(
    folders.map(async (bin) => {
      const { output } = await run(path.join(bin, 'postgres'), ['--version']);
      return { bin, major: Number(/ (\d+)/.exec(output)?.[1]) };
    }),
  );
  return found.filter(({ major }) => Number.isInteger(major));
}
