import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { expect, type Locator, type Page } from '@playwright/test';
import type { Study } from '../src/study/index.ts';
import { studyFrom } from './engineSays.ts';

/** The rail's handle: a slider whose value text says order, frequency and impedance in words. */
export function rail(page: Page): Locator {
  return page.getByRole('slider', { name: /^Harmonic order at/ });
}

export function note(page: Page, title: string): Locator {
  return page.getByRole('region', { name: 'Notes' }).getByRole('article', { name: new RegExp(`^${title}`) });
}

export function part(page: Page, name: RegExp): Locator {
  return page.getByRole('region', { name: 'Drawing' }).getByRole('button', { name });
}

/** Saving goes to a download, as in a browser without file pickers, so that a test can read it. */
export async function saveByDownload(page: Page): Promise<void> {
  await page.addInitScript(() => {
    for (const picker of ['showSaveFilePicker', 'showOpenFilePicker']) Reflect.deleteProperty(window, picker);
  });
}

/** Waits until everything on screen was computed from the study on screen. */
export async function settled(page: Page): Promise<void> {
  await expect(page.locator('.count[data-verdict="fail"]')).toContainText(
    /\d+ fail in this case · \d+ in all/,
    {
      timeout: 30_000,
    },
  );
}

/** The study on the table, as the save command writes it. */
export async function savedStudy(page: Page): Promise<Study> {
  const [download] = await Promise.all([page.waitForEvent('download'), page.keyboard.press('Control+s')]);
  return studyFrom(readFileSync(await download.path(), 'utf8'));
}

/** Text of a PDF as it lies on the paper, page by page. */
export function pdfPages(path: string): string[] {
  return execFileSync('pdftotext', ['-layout', path, '-'], { encoding: 'utf8' }).split('\f').slice(0, -1);
}

/** Middle of what a locator shows. */
export async function middle(locator: Locator): Promise<{ x: number; y: number }> {
  const box = await locator.boundingBox();
  if (!box) throw new Error('nothing to point at');
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}
