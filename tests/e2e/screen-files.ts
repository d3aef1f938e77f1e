import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';

/** The scripts of a built site. */
export class BuiltScripts {
  readonly names: string[];
  private readonly outDir: string;

  private constructor(outDir: string, names: string[]) {
    this.outDir = outDir;
    this.names = names;
  }

  static async read(outDir: string): Promise<BuiltScripts> {
    return new BuiltScripts(outDir, await readdir(join(outDir, 'assets')));
  }

  /** The file that a screen's own module was built into. */
  fileOf(screen: string): string {
    return this.names.find((name) => name.startsWith(`${screen}-`) && name.endsWith('.js'))!;
  }

  /** The files that must be there before a screen runs: what index.html and its own file name, and what those name in turn. */
  async filesFor(screen: string): Promise<string[]> {
    const html = await readFile(join(this.outDir, 'index.html'), 'utf8');
    const wanted = [...[...html.matchAll(/assets\/([\w.-]+\.js)/g)].map(([, name]) => name!), this.fileOf(screen)];
    const files = new Set<string>();
    for (let name = wanted.pop(); name !== undefined; name = wanted.pop()) {
      if (files.has(name)) continue;
      files.add(name);
      const named = (await this.sourceOf(name)).matchAll(/(?:from|import)\s*"\.\/([\w.-]+\.js)"/g);
      wanted.push(...[...named].map(([, file]) => file!));
    }
    return [...files];
  }

  /** What files weigh together, each gzipped, in bytes. */
  async gzippedBytes(files: string[]): Promise<number> {
    const sizes = await Promise.all(files.map(async (name) => gzipSync(await this.sourceOf(name)).length));
    return sizes.reduce((sum, size) => sum + size, 0);
  }

  private sourceOf(name: string): Promise<string> {
    return readFile(join(this.outDir, 'assets', name), 'utf8');
  }
}
