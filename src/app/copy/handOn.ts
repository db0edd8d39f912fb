import type { FigureValues, PictureWay } from '../../charts/index.ts';
import { workbench } from '../../store/index.ts';
import { tabularText } from '../../study/index.ts';
import { download } from '../sheet/download.ts';
import { pngOf } from './pngOf.ts';
import { type Picture, standaloneSvg } from './standaloneSvg.ts';

/** A picture and the numbers it draws. */
export interface HandedOn extends Picture {
  values: FigureValues;
}

/** Copies or saves a picture, or copies its numbers, and says what came of it. */
export async function handOn(handed: HandedOn, way: PictureWay): Promise<void> {
  const { say } = workbench.getState();
  try {
    await ways[way](handed);
    say(`${saidOf[way]}: ${handed.name}`);
  } catch (cause) {
    const reason = cause instanceof Error ? cause.message : String(cause);
    say(`${handed.name} could not be handed on: ${reason}`);
  }
}

/** Puts words on the clipboard and says so. */
export async function copyText(text: string, name: string): Promise<void> {
  const { say } = workbench.getState();
  try {
    await navigator.clipboard.writeText(text);
    say(`Copied: ${name}`);
  } catch {
    say('The browser gave no access to the clipboard');
  }
}

const saidOf: Record<PictureWay, string> = {
  copySvg: 'Copied as SVG',
  copyPng: 'Copied as PNG',
  saveSvg: 'Saved as SVG',
  savePng: 'Saved as PNG',
  copyValues: 'Copied as a table',
};

const ways: Record<PictureWay, (handed: HandedOn) => Promise<void>> = {
  copySvg: async (handed) => {
    const text = standaloneSvg(handed);
    const kinds = ['text/plain', 'image/svg+xml'].filter((kind) => ClipboardItem.supports(kind));
    const blobs = kinds.map((kind) => [kind, new Blob([text], { type: kind })]);
    await navigator.clipboard.write([new ClipboardItem(Object.fromEntries(blobs))]);
  },
  // The promise is handed over unsettled, because a browser forgets the press while it is waited for.
  copyPng: (handed) => navigator.clipboard.write([new ClipboardItem({ 'image/png': pngOf(handed) })]),
  saveSvg: async (handed) =>
    download(new Blob([standaloneSvg(handed)], { type: 'image/svg+xml' }), `${fileStem(handed.name)}.svg`),
  savePng: async (handed) => download(await pngOf(handed), `${fileStem(handed.name)}.png`),
  copyValues: ({ values }) => navigator.clipboard.writeText(tabularText(values)),
};

/** A file name from words: letters and digits of any script, joined by hyphens. */
export function fileStem(name: string): string {
  const stem = name.replaceAll(/[^\p{L}\p{N}]+/gu, '-').replaceAll(/^-+|-+$/g, '');
  return stem === '' ? 'picture' : stem;
}
