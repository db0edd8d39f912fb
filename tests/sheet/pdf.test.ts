import { readFileSync } from 'node:fs';
import { inflateSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { buildDocument } from '../../src/sheet/document/index.ts';
import { layoutPages } from '../../src/sheet/pages/layoutPages.ts';
import { deflatePdf } from '../../src/sheet/pdf/deflatePdf.ts';
import { exportSheet } from '../../src/sheet/pdf/exportSheet.ts';
import type { FontFiles } from '../../src/sheet/pdf/fontFiles.ts';
import { inputOf, quarry, verdict } from './sampleInput.ts';

const font = (face: string): string =>
  readFileSync(new URL(`../../public/fonts/${face}.ttf`, import.meta.url)).toString('base64');

const fonts: FontFiles = {
  'varwright-sans-regular': font('varwright-sans-regular'),
  'varwright-sans-semibold': font('varwright-sans-semibold'),
  'varwright-marks': font('varwright-marks'),
};

const document = buildDocument(inputOf(quarry, [verdict({ check: 'bank-current', caseId: 'day' })]));

/** Figures need a page to be measured in; they are left to the browser tests. */
const write = async (signal?: AbortSignal, onProgress?: () => void): Promise<Buffer> => {
  const options = { fonts, ...(signal ? { signal } : {}), ...(onProgress ? { onProgress } : {}) };
  const blob = await exportSheet(document, () => null, options);
  return Buffer.from(await blob.arrayBuffer());
};

/** Bytes of each object by the cross-reference table at the end of the file. */
function objectsOf(pdf: Buffer): string[] {
  const text = pdf.toString('latin1');
  const start = Number(/startxref\s+(\d+)/.exec(text.slice(-64))?.[1]);
  expect(text.slice(start, start + 4)).toBe('xref');
  const rows = [...text.slice(start).matchAll(/^(\d{10}) \d{5} n ?$/gm)].map(([, at]) => Number(at));
  return rows.map((at) => text.slice(at, text.indexOf('endobj', at)));
}

describe('the PDF of the sheet', () => {
  it('is the same to the last byte when written twice', async () => {
    expect((await write()).equals(await write())).toBe(true);
  });

  it('has as many pages as the preview shows and a sound cross-reference table', async () => {
    const objects = objectsOf(await write());
    objects.forEach((object) => {
      expect(object).toMatch(/^\d+ 0 obj/);
    });
    expect(objects.filter((object) => /\/Type \/Page\b(?!s)/.test(object))).toHaveLength(
      layoutPages(document).length,
    );
  });

  it('compresses its streams so that they inflate to the length they had', async () => {
    const streams = objectsOf(await write()).filter((object) => object.includes('/Filter /FlateDecode'));
    expect(streams.length).toBeGreaterThan(layoutPages(document).length);
    for (const stream of streams) {
      const length = Number(/\/Length (\d+)/.exec(stream)?.[1]);
      const from = /stream\r?\n/.exec(stream);
      if (!from) throw new Error('no stream');
      const at = from.index + from[0].length;
      expect(inflateSync(Buffer.from(stream.slice(at, at + length), 'latin1')).length).toBeGreaterThan(0);
    }
  });

  it('carries the date of the revision and the fingerprint, and no other time', async () => {
    const text = (await write()).toString('latin1');
    expect(text).toContain("/CreationDate (D:20260304000000+00'00')");
    expect(text.match(/\/CreationDate|\/ModDate/g)).toEqual(['/CreationDate']);
    expect(text).toContain(`<${document.fingerprint.slice(0, 32).toUpperCase()}>`);
  });

  it('reports every page and can be stopped', async () => {
    let steps = 0;
    await write(undefined, () => {
      steps += 1;
    });
    expect(steps).toBeGreaterThanOrEqual(layoutPages(document).length);
    const stop = new AbortController();
    const stopped = write(stop.signal, () => stop.abort(new Error('stopped by the user')));
    await expect(stopped).rejects.toThrow('stopped by the user');
  });

  it('refuses to compress what is no PDF', async () => {
    await expect(deflatePdf(new TextEncoder().encode('no pdf at all'), async () => {})).rejects.toThrow(
      RangeError,
    );
  });
});
