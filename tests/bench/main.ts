import os from 'node:os';
import pg from 'pg';
import { CLUSTER_URL } from '#tests/worlds/postgres.ts';
import { DEVICES } from './crew.ts';
import { benchAmend, type AmendFinding } from './amend-bench.ts';
import { BenchPhone } from './bench-phone.ts';
import { benchHold } from './hold-bench.ts';
import { benchInp, type InpFindings } from './inp-bench.ts';
import type { Figure, Finding } from './measuring.ts';
import { benchMerge, type MergeFindings } from './merge-bench.ts';
import { benchOpen } from './open-bench.ts';
import { benchPhotos } from './photos-bench.ts';
import { figuresTable, findingsTable, table } from './print.ts';
import { benchPull } from './pull-bench.ts';
import { weighAlongside } from './weight-bench.ts';
import { hangUp } from './wire.ts';

// Most figures are ratios of two ways of doing the same work, measured in turns in this one run: only that can be
// compared between machines. What a person waits for on a phone is measured as it is. `npm run bench -- merge` runs the benches that are named alone.
const PHONE_ENTRIES = 10_000;
const wanted = process.argv.slice(3);
const isWanted = (name: string) => wanted.length === 0 || wanted.includes(name);

console.log(`${await settings()}; ${os.cpus().length} cores, Node ${process.version}; server, bench and PostgreSQL on one machine`);
const findings: Finding[] = [];
const merge = isWanted('merge') ? await benchMerge() : null;
findings.push(...(merge?.findings ?? []));
if (isWanted('pull')) findings.push(await benchPull());
if (isWanted('photos')) findings.push(...(await benchPhotos()));
if (isWanted('hold')) findings.push(await benchHold());
const figures: Figure[] = [];
const inp = await phoneBenches(figures);
const amend = isWanted('amend') ? await benchAmend() : null;
hangUp();

if (findings.length > 0) console.log(`\n${findingsTable(findings)}`);
if (figures.length > 0) console.log(`\n${figuresTable(figures)}`);
if (inp) console.log(`\n${stepsTable(inp)}`);
if (amend) console.log(`\n${amendLine(amend)}`);
if (merge) console.log(`\n${spendingTable(merge)}`);

/** What decides whether a commit is durable, the same for both sides and as the product's own cluster has it. */
async function settings(): Promise<string> {
  const client = new pg.Client({ connectionString: process.env[CLUSTER_URL] });
  await client.connect();
  const names = ['fsync', 'synchronous_commit', 'full_page_writes', 'wal_sync_method'];
  const shown: string[] = [];
  for (const name of names) shown.push(`${name} ${(await client.query(`SHOW ${name}`)).rows[0][name]}`);
  await client.end();
  return `PostgreSQL: ${shown.join(', ')}`;
}

/** The benches that need a phone with a record in it. */
async function phoneBenches(figures: Figure[]): Promise<InpFindings | null> {
  if (!isWanted('open') && !isWanted('inp')) return null;
  const phone = await BenchPhone.unpack(PHONE_ENTRIES);
  try {
    figures.push(await weighAlongside(phone));
    if (isWanted('open')) figures.push(await benchOpen(phone));
    const inp = isWanted('inp') ? await benchInp(phone) : null;
    if (inp) figures.push(inp.figure);
    return inp;
  } finally {
    await phone.putAway();
  }
}

function stepsTable({ steps }: InpFindings): string {
  const lines = [...steps].map(([step, rounds]) => [step, ...rounds.map((ms) => ms.toFixed(0))]);
  return table([['its steps, each round by itself, in ms', ...lines[0]!.slice(1).map(() => '')], ...lines]);
}

function amendLine({ kept, live, of, ms }: AmendFinding): string {
  return `${DEVICES} devices amend the same ${of / DEVICES} entries in different fields at once: ${kept} of ${of} kept, ${live} of ${of} live, ${ms.toFixed(0)} ms`;
}

function spendingTable({ spending }: MergeFindings): string {
  const total = [...spending.values()].reduce((sum, ms) => sum + ms, 0);
  const lines = [...spending].map(([part, ms]) => [part, ms.toFixed(2), `${Math.round((100 * ms) / total)} %`]);
  return table([['one device of the first bench: where the time goes', 'ms', ''], ...lines, ['all', total.toFixed(2), '']]);
}
