import { BuiltScripts } from '#tests/e2e/screen-files.ts';
import type { BenchPhone } from './bench-phone.ts';
import type { Figure } from './measuring.ts';

const KIB = 1024;
const GOAL_KIB = 170;

/** The JavaScript that must be there before Alongside is shown, gzipped. */
export async function weighAlongside({ distDir }: BenchPhone): Promise<Figure> {
  const scripts = await BuiltScripts.read(distDir);
  const bytes = await scripts.gzippedBytes(await scripts.filesFor('alongside-page'));
  return { what: 'JavaScript for Alongside, gzipped', unit: 'KiB', values: [bytes / KIB], goal: GOAL_KIB };
}
