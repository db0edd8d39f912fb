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

/** Opens a sample site and waits for its answer. */
export async function openSampleSite(
  page: Page,
  id: 'cold-store' | 'office-tower' | 'waterworks',
): Promise<void> {
  await page.goto(`/?sample=${id}`);
  await expect(page.getByRole('region', { name: 'Drawing' })).toBeVisible();
  await settled(page);
}

/** Opens a part's data by a click and Enter, as its slip. */
export async function slipOf(page: Page, name: RegExp): Promise<Locator> {
  await part(page, name).locator('.hit').first().click();
  await page.keyboard.press('Enter');
  const slip = page.locator('.slip');
  await expect(slip).toBeVisible();
  return slip;
}

/** Takes a kind from the tray and holds it over a point; the pointer is not let go yet. */
export async function carryFromTray(page: Page, kind: string, to: { x: number; y: number }): Promise<void> {
  const symbol = page.locator(`[data-tray="${kind}"]`);
  await symbol.scrollIntoViewIfNeeded();
  await carry(page, await middle(symbol), to);
}

/** Presses at one point and moves to another; the pointer is not let go yet. */
export async function carry(
  page: Page,
  from: { x: number; y: number },
  to: { x: number; y: number },
): Promise<void> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(to.x, to.y, { steps: 6 });
}

/** A point just under a busbar, at a fraction of its length. */
export async function under(bus: Locator, fraction: number): Promise<{ x: number; y: number }> {
  const bar = await bus.locator('.bar').first().boundingBox();
  if (!bar) throw new Error('no busbar to point at');
  return { x: bar.x + bar.width * fraction, y: bar.y + bar.height / 2 + 24 };
}

/** What Undo would undo, in the words of the command list. */
export async function undoWords(page: Page): Promise<string> {
  await page.keyboard.press('Control+k');
  await expect(page.getByRole('searchbox', { name: 'Find a command' })).toBeFocused();
  await page.keyboard.type('undo');
  const words = await page.getByRole('menuitem', { name: /^Undo/ }).textContent();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('searchbox', { name: 'Find a command' })).toBeHidden();
  return (words ?? '').replace(/^Undo:? ?/, '').replace(/Ctrl\+Z$/, '');
}
