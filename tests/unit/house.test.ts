import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';

// The rules of the house that no compiler holds: who may import whom, how files are called, how long they get.
const root = path.resolve(fileURLToPath(import.meta.url), '../../..');
const LINES_MAX = 400;
const SHARED_PACKAGES = ['zod', '@noble/hashes', 'canonicalize'];

type Source = { file: string; text: string; imports: string[] };

function sourcesIn(folder: string): Source[] {
  return readdirSync(path.join(root, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.(tsx?|m?js)$/.test(name))
    .map((name) => {
      const file = path.posix.join(folder, name);
      const text = readFileSync(path.join(root, file), 'utf8');
      return { file, text, imports: importsOf(file, text) };
    });
}

/** Every import as a path from the project's root, or a package's name. */
function importsOf(file: string, text: string): string[] {
  const named = [...text.matchAll(/(?:\bfrom|\bimport|\bimport\()\s*['"]([^'"]+)['"]/g)].map(
    ([, name]) => name!,
  );
  return named.map((name) => {
    if (name.startsWith('.')) return path.posix.join(path.posix.dirname(file), name);
    return name.replace(/^#/, '');
  });
}

function crossings(sources: Source[], isForbidden: (imported: string, file: string) => boolean): string[] {
  return sources.flatMap(({ file, imports }) =>
    imports
      .filter((imported) => isForbidden(imported, file))
      .map((imported) => `${file} imports ${imported}`),
  );
}

const shared = sourcesIn('shared');
const server = sourcesIn('server');
const src = sourcesIn('src');
const tests = sourcesIn('tests');
const product = [...shared, ...server, ...src];

describe('who imports whom', () => {
  test('there is something to look at', () => {
    for (const sources of [shared, server, src, tests]) expect(sources.length).toBeGreaterThan(0);
    expect(product.flatMap(({ imports }) => imports).length).toBeGreaterThan(50);
  });

  test('src never reaches into the server or the tests', () => {
    expect(crossings(src, (imported) => /^(server|tests)\//.test(imported))).toEqual([]);
  });

  test('the server never reaches into src or the tests', () => {
    expect(crossings(server, (imported) => /^(src|tests)\//.test(imported))).toEqual([]);
  });

  test('shared imports itself and a few pure packages', () => {
    const isPure = (name: string) =>
      SHARED_PACKAGES.some((pure) => name === pure || name.startsWith(`${pure}/`));
    expect(crossings(shared, (imported) => !imported.startsWith('shared/') && !isPure(imported))).toEqual([]);
  });

  test('shared reads no clock and draws no lots', () => {
    const impure = /\bDate\.now\(|\bnew Date\(\)|\bMath\.random\(|\bcrypto\.(randomUUID|getRandomValues)\(/;
    expect(shared.filter(({ text }) => impure.test(text)).map(({ file }) => file)).toEqual([]);
  });

  test('a place never imports another place', () => {
    const placeOf = (file: string) => /^src\/routes\/([^/]+)\//.exec(file)?.[1];
    const isOther = (imported: string, file: string) => {
      const [from, to] = [placeOf(file), placeOf(imported)];
      return from !== undefined && to !== undefined && from !== to;
    };
    expect(crossings(src, isOther)).toEqual([]);
  });

  test('only the replica touches IndexedDB', () => {
    const touches = ({ file, text }: Source) =>
      !file.startsWith('src/replica/') && /\bindexedDB\b|idb-keyval/.test(text);
    expect(src.filter(touches).map(({ file }) => file)).toEqual([]);
  });
});

describe('names and sizes', () => {
  test('no file is named for having no subject, and none only passes on others', () => {
    const nameless = /(^|[/.-])(utils?|helpers?|common|misc)([/.-]|$)|(^|\/)index\.(tsx?|m?js)$/;
    expect([...product, ...tests].map(({ file }) => file).filter((file) => nameless.test(file))).toEqual([]);
  });

  test(`no file of the product is longer than ${LINES_MAX} lines`, () => {
    const tooLong = product.filter(({ text }) => text.trimEnd().split('\n').length > LINES_MAX);
    expect(tooLong.map(({ file }) => file)).toEqual([]);
  });

  test('imports of our own files say their extension', () => {
    const isBare = (imported: string) =>
      /^(shared|server|src|tests)\//.test(imported) &&
      !/\.(tsx?|m?js|css|json|svg|woff2)(\?\w+)?$/.test(imported);
    expect(crossings([...product, ...tests], isBare)).toEqual([]);
  });

  test('nothing reads beyond the project', () => {
    const beyond = ['..', 'shared'].join('/');
    const leaves = ({ file, text }: Source) =>
      [...text.matchAll(/['"`]((?:\.\.\/)+[^'"`]*)['"`]/g)].some(([, to]) =>
        path.posix.join(path.posix.dirname(file), to!).startsWith(beyond),
      );
    expect([...product, ...tests].filter(leaves).map(({ file }) => file)).toEqual([]);
  });
});
