/**
 * Makes the font subsets of screen and sheet, and the widths the page layout measures with.
 * Run by hand after a change: node --import tsx src/sheet/fonts/make-fonts.ts
 */
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import subsetFont from 'subset-font';
import { advanceWidths, renamed } from './sfnt.ts';

const here = dirname(fileURLToPath(import.meta.url));
const target = join(here, '../../../public/fonts');
const require = createRequire(import.meta.url);
const packageFolder = (name: string): string => dirname(require.resolve(`${name}/package.json`));

const span = (from: number, to: number): number[] =>
  Array.from({ length: to - from + 1 }, (_, index) => from + index);

/** Latin with its extensions, Greek, Cyrillic, punctuation, raised and lowered figures, arrows, mathematics. */
const TEXT = [
  ...span(0x20, 0x7e),
  ...span(0xa0, 0x17f),
  ...span(0x370, 0x3ff),
  ...span(0x400, 0x45f),
  ...span(0x2000, 0x206f),
  ...span(0x2070, 0x209f),
  ...span(0x2100, 0x218f),
  ...span(0x2190, 0x21ff),
  ...span(0x2200, 0x22ff),
  ...span(0x25a0, 0x25ff),
  ...span(0x2713, 0x2717),
];

/** What the text family lacks and the trade writes. */
const MARKS = [...'∠∥✕✓≪≫∝△▽□▮∟⊥'].map((mark) => mark.codePointAt(0) ?? 0);

const SCREEN_FEATURES = ['kern', 'mark', 'mkmk', 'ccmp', 'locl', 'tnum', 'lnum'];

interface Cut {
  file: string;
  source: string;
  family: string;
  style: string;
  codes: number[];
  notice: string;
}

const adobe =
  "Subset of a typeface copyright 2010-2024 Adobe (http://www.adobe.com/), with Reserved Font Name 'Source'; renamed as its licence, the SIL Open Font License 1.1, asks.";
const vera =
  'Subset of DejaVu Sans Condensed. Copyright (c) 2003 by Bitstream, Inc. All Rights Reserved. DejaVu changes are in public domain.';

const CUTS: Cut[] = [
  {
    file: 'varwright-sans-regular',
    source: join(packageFolder('source-sans'), 'TTF/SourceSans3-Regular.ttf'),
    family: 'Varwright Sans',
    style: 'Regular',
    codes: TEXT,
    notice: adobe,
  },
  {
    file: 'varwright-sans-semibold',
    source: join(packageFolder('source-sans'), 'TTF/SourceSans3-Semibold.ttf'),
    family: 'Varwright Sans',
    style: 'Semibold',
    codes: TEXT,
    notice: adobe,
  },
  {
    file: 'varwright-marks',
    source: join(packageFolder('dejavu-fonts-ttf'), 'ttf/DejaVuSansCondensed.ttf'),
    family: 'Varwright Marks',
    style: 'Regular',
    codes: MARKS,
    notice: vera,
  },
];

function namesOf(cut: Cut): Map<number, string> {
  const postscript = `${cut.family.replace(' ', '')}-${cut.style}`;
  return new Map([
    [0, cut.notice],
    [1, cut.style === 'Regular' ? cut.family : `${cut.family} ${cut.style}`],
    [2, 'Regular'],
    [3, `${postscript};subset 1`],
    [4, `${cut.family} ${cut.style}`],
    [5, 'Version 1.0'],
    [6, postscript],
    [13, 'See the licence notices beside this file.'],
  ]);
}

/** Runs of consecutive code points: first code point → its width and those after it. */
function runsOf(widths: Map<number, number>): Record<string, string> {
  const runs: [first: number, widths: number[]][] = [];
  for (const [code, width] of [...widths].sort(([a], [b]) => a - b)) {
    const last = runs.at(-1);
    if (last && last[0] + last[1].length === code) last[1].push(width);
    else runs.push([code, [width]]);
  }
  return Object.fromEntries(runs.map(([first, run]) => [String(first), run.join(' ')]));
}

async function makeCut(cut: Cut): Promise<[string, Record<string, string>]> {
  const text = String.fromCodePoint(...cut.codes);
  const source = await readFile(cut.source);
  const names = namesOf(cut);
  const plain = renamed(
    await subsetFont(source, text, { targetFormat: 'sfnt', keepFeatures: [], noHinting: true }),
    names,
  );
  await writeFile(join(target, `${cut.file}.ttf`), plain);
  const full = renamed(
    await subsetFont(source, text, { targetFormat: 'sfnt', keepFeatures: SCREEN_FEATURES }),
    names,
  );
  const screen = await subsetFont(full, undefined, {
    targetFormat: 'woff2',
    keepAllGlyphs: true,
    preserveNameIds: [13],
  });
  await writeFile(join(target, `${cut.file}.woff2`), screen);
  return [cut.file, runsOf(advanceWidths(plain, cut.codes))];
}

await mkdir(target, { recursive: true });
const metrics = Object.fromEntries(await Promise.all(CUTS.map(makeCut)));
await writeFile(join(here, 'metrics.json'), `${JSON.stringify(metrics, null, 2)}\n`);
for (const [from, file] of [
  [join(packageFolder('source-sans'), 'LICENSE.md'), 'varwright-sans-licence.md'],
  [join(packageFolder('dejavu-fonts-ttf'), 'LICENSE'), 'varwright-marks-licence.txt'],
] as const) {
  await writeFile(join(target, file), await readFile(from));
}
