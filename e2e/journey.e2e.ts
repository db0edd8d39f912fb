import { expect, type Page, test } from '@playwright/test';
import type { Study } from '../src/study/index.ts';
import { cosPhi, impedanceOhm, parallelOrder } from './engineSays.ts';
import { middle, note, part, pdfPages, rail, saveByDownload, savedStudy, settled } from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await page.goto('/');
  await expect(page.getByRole('region', { name: 'Drawing' })).toBeVisible();
});

/** The screen agrees with the engine run here on the very study that was saved. */
async function agreesWithEngine(page: Page, study: Study): Promise<void> {
  const expectedCosPhi = cosPhi(study, 'day', 'supply', 'intake').toFixed(3);
  await expect(note(page, 'Intake · current from Supply')).toContainText(`cos φ${expectedCosPhi}`);
  const order = parallelOrder(study, 'day', 'main').toFixed(2);
  await expect(page.locator('.rail-plot')).toContainText(`parallel h ${order}`);
}

async function handleAgreesWithEngine(page: Page, study: Study): Promise<void> {
  const order = Number(await rail(page).getAttribute('aria-valuenow'));
  const milliohm = impedanceOhm(study, 'day', 'main', order) * 1000;
  const said = (await rail(page).getAttribute('aria-valuetext')) ?? '';
  const shown = Number(/impedance ([\d.]+)\sm/.exec(said)?.[1]);
  expect(Math.abs(shown / milliohm - 1), said).toBeLessThan(0.006);
}

function sheetIsComplete(path: string, study: Study): void {
  const pages = pdfPages(path);
  const text = pages.join('\n');
  pages.forEach((one, index) => {
    expect(one).toContain(`${index + 1} of ${pages.length}`);
  });
  expect(text).toContain(study.title);
  for (const element of study.elements) expect(text).toContain(element.name ?? element.id);
  for (const one of study.cases ?? []) expect(text).toContain(one.name ?? one.id);
  for (const glyph of ['φ', 'Ω', '°', '√', '²', '−']) expect(text, `glyph ${glyph}`).toContain(glyph);
  expect(text).toContain(cosPhi(study, 'day', 'supply', 'intake').toFixed(3));
}

test('by mouse: from an empty page to the results sheet, and everything is there after a reload', async ({
  page,
}) => {
  await page.getByRole('button', { name: /Brackwater cold store/ }).click();
  await expect(page.getByRole('button', { name: /Brackwater cold store · as found/ })).toBeVisible();
  await settled(page);
  const before = await savedStudy(page);
  await agreesWithEngine(page, before);

  const from = await middle(page.locator('[data-tray="bank"]'));
  const bar = await part(page, /^busbar, Main board/).boundingBox();
  if (!bar) throw new Error('no main board on the drawing');
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(bar.x + bar.width * 0.8, bar.y + bar.height / 2 + 30, { steps: 8 });
  await page.mouse.up();
  await settled(page);
  const after = await savedStudy(page);
  expect(after.elements).toHaveLength(before.elements.length + 1);
  expect(after.elements.at(-1)).toMatchObject({ kind: 'bank', bus: 'main' });
  await agreesWithEngine(page, after);
  expect(parallelOrder(after, 'day', 'main')).toBeLessThan(parallelOrder(before, 'day', 'main'));

  await page.keyboard.press('Escape');
  const handle = await rail(page).boundingBox();
  if (!handle) throw new Error('no rail');
  await page.mouse.move(handle.x + 260, handle.y + 90);
  await page.mouse.down();
  await page.mouse.move(handle.x + 700, handle.y + 60, { steps: 12 });
  await page.mouse.up();
  expect(Number(await rail(page).getAttribute('aria-valuenow'))).toBeGreaterThan(2);
  await handleAgreesWithEngine(page, after);

  await page.getByRole('button', { name: 'Sheet', exact: true }).click();
  const exporting = page.getByRole('button', { name: 'Export PDF' });
  await expect(exporting).toBeEnabled({ timeout: 30_000 });
  const [pdf] = await Promise.all([page.waitForEvent('download', { timeout: 60_000 }), exporting.click()]);
  sheetIsComplete(await pdf.path(), after);

  await page.reload();
  await settled(page);
  expect(await savedStudy(page)).toEqual(after);
  await page.getByRole('button', { name: 'Site', exact: true }).click();
  await agreesWithEngine(page, after);
});

async function tabTo(page: Page, selector: string): Promise<void> {
  for (let presses = 0; presses < 120; presses += 1) {
    if (await page.evaluate((wanted) => document.activeElement?.matches(wanted), selector)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`Tab never reaches ${selector}`);
}

async function command(page: Page, words: string): Promise<void> {
  await page.keyboard.press('Control+k');
  await expect(page.getByRole('searchbox', { name: 'Find a command' })).toBeFocused();
  await page.keyboard.type(words);
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
}

test('by keyboard alone: the same job', async ({ page }) => {
  await command(page, 'Sample: Brackwater');
  await expect(page.getByRole('button', { name: /Brackwater cold store · as found/ })).toBeVisible();
  await settled(page);
  const before = await savedStudy(page);

  await tabTo(page, '[data-tray]');
  for (let presses = 0; presses < 9; presses += 1) await page.keyboard.press('ArrowDown');
  await expect(page.locator('[data-tray="bank"]')).toBeFocused();
  await page.keyboard.press('Enter');
  const plan = page.locator('output.plan');
  await expect(plan).toContainText('Main board');
  await page.keyboard.press('ArrowDown');
  await expect(plan).toContainText('Drives board');
  await page.keyboard.press('ArrowUp');
  await expect(plan).toContainText('Main board');
  await page.keyboard.press('Enter');
  await settled(page);
  await page.keyboard.press('Escape');
  const after = await savedStudy(page);
  expect(after.elements).toHaveLength(before.elements.length + 1);
  expect(after.elements.at(-1)).toMatchObject({ kind: 'bank', bus: 'main' });
  await agreesWithEngine(page, after);

  await tabTo(page, '.rail-plot');
  await page.keyboard.press('Home');
  for (let order = 1; order < 5; order += 1) await page.keyboard.press('ArrowRight');
  await expect(rail(page)).toHaveAttribute('aria-valuenow', '5');
  await page.keyboard.press('p');
  const peak = Number(await rail(page).getAttribute('aria-valuenow'));
  expect(peak).toBeGreaterThan(5);
  await handleAgreesWithEngine(page, after);

  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toHaveLength(before.elements.length);
  await page.keyboard.press('Control+Shift+z');
  await settled(page);

  await command(page, 'Go to Sheet');
  await expect(page.getByRole('button', { name: 'Export PDF' })).toBeEnabled({ timeout: 30_000 });
  await tabTo(page, '.sheet-export');
  const [pdf] = await Promise.all([
    page.waitForEvent('download', { timeout: 60_000 }),
    page.keyboard.press('Enter'),
  ]);
  sheetIsComplete(await pdf.path(), after);

  await page.reload();
  await settled(page);
  expect(await savedStudy(page)).toEqual(after);
});
