import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';

/** What each folder of src may import, besides itself. Type-only imports count. */
const mayImport: Record<string, readonly string[]> = {
  study: [],
  engine: ['study'],
  checks: ['study', 'engine'],
  sizing: ['study', 'engine', 'checks'],
  cli: ['study', 'engine', 'checks', 'sizing'],
  worker: ['study', 'engine', 'checks', 'sizing'],
  store: ['study', 'engine', 'checks', 'sizing', 'worker'],
  keys: [],
  drawing: ['study', 'engine', 'checks', 'sizing', 'worker', 'store', 'keys'],
  charts: ['study', 'engine', 'checks', 'sizing', 'worker', 'store', 'keys'],
  sheet: ['study', 'engine', 'checks', 'sizing', 'worker', 'store', 'drawing', 'charts'],
  app: ['study', 'engine', 'checks', 'sizing', 'worker', 'store', 'keys', 'drawing', 'charts', 'sheet'],
};

/** Packages the pure folders may use: no DOM, no React. */
const purePackages = new Set(['complex.js', 'zod', '@noble/hashes', 'd3-hierarchy']);
const pureFolders = [
  'study',
  'engine',
  'checks',
  'sizing',
  'drawing/layout',
  'sheet/document',
  'sheet/pages',
];

const src = resolve(import.meta.dirname, '../../src');

function sources(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return sources(path);
    return /\.tsx?$/.test(name) ? [path] : [];
  });
}

/** Every module specifier a file names: static, type-only, re-exported, dynamic, or a worker's URL. */
function specifiers(file: string): string[] {
  const text = readFileSync(file, 'utf8').replace(/\/\*[\s\S]*?\*\/|^\s*\/\/.*$/gm, '');
  const found = text.matchAll(
    /(?:[\s}*]from\s+|\bimport\s*\(\s*|^import\s+|new URL\(\s*)['"]([^'"\n]+)['"]/gm,
  );
  return [...found].map((match) => match[1] as string);
}

interface Import {
  from: string;
  to: string;
}

const files = sources(src);
const imports: Import[] = files.flatMap((file) =>
  specifiers(file)
    .filter((name) => name.startsWith('.') && /\.tsx?$/.test(name))
    .map((name) => ({ from: relative(src, file), to: relative(src, resolve(dirname(file), name)) })),
);
const folderOf = (path: string): string => path.split('/')[0] as string;

describe('the tree', () => {
  it('names only known folders', () => {
    expect([...new Set(files.map((file) => folderOf(relative(src, file))))].sort()).toEqual(
      expect.arrayContaining(['study']),
    );
    for (const file of files) expect(Object.keys(mayImport)).toContain(folderOf(relative(src, file)));
  });

  it('imports upward only', () => {
    const wrong = imports.filter(({ from, to }) => {
      const [a, b] = [folderOf(from), folderOf(to)];
      return a !== b && !mayImport[a]?.includes(b);
    });
    expect(wrong).toEqual([]);
  });

  it('crosses folders through their index only', () => {
    const wrong = imports.filter(
      ({ from, to }) =>
        folderOf(from) !== folderOf(to) && !/\/index\.ts$/.test(to) && !to.endsWith('.worker.ts'),
    );
    expect(wrong).toEqual([]);
  });

  it('has no import cycles', () => {
    const next = new Map<string, string[]>();
    for (const { from, to } of imports) next.set(from, [...(next.get(from) ?? []), to]);
    const state = new Map<string, 'open' | 'done'>();
    const cycles: string[] = [];
    const visit = (file: string, trail: string[]): void => {
      if (state.get(file) === 'done') return;
      if (state.get(file) === 'open') {
        cycles.push([...trail.slice(trail.indexOf(file)), file].join(' → '));
        return;
      }
      state.set(file, 'open');
      for (const target of next.get(file) ?? []) visit(target, [...trail, file]);
      state.set(file, 'done');
    };
    for (const file of next.keys()) visit(file, []);
    expect(cycles).toEqual([]);
  });

  it('keeps DOM and React packages out of the pure folders', () => {
    const wrong = files
      .filter((file) => pureFolders.some((folder) => relative(src, file).startsWith(`${folder}/`)))
      .flatMap((file) =>
        specifiers(file)
          .filter((name) => !name.startsWith('.'))
          .map((name) =>
            name.startsWith('@') ? name.split('/').slice(0, 2).join('/') : (name.split('/')[0] as string),
          )
          .filter((name) => !purePackages.has(name))
          .map((name) => `${relative(src, file)}: ${name}`),
      );
    expect(wrong).toEqual([]);
  });
});
