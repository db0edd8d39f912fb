import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { cosPhi } from './engineSays.ts';
import { saveByDownload, savedStudy, settled, undoWords } from './workbench.ts';

const form = (page: Page) => page.getByRole('form', { name: /^Quick start/ });
const field = (page: Page, label: string) => form(page).getByLabel(label, { exact: true });
const list = (page: Page) => page.getByRole('region', { name: /^Assumed/ });

async function accessible(page: Page, where: string): Promise<void> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
    .analyze();
  expect(
    violations.map(({ id, nodes }) => `${where}: ${id}: ${nodes.map((node) => node.html).join(' | ')}`),
  ).toEqual([]);
}

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await page.goto('/');
  await expect(form(page)).toBeVisible();
});

test('eight fields by keyboard give the site, its first verdicts and the list of what was assumed', async ({
  page,
}) => {
  expect(await form(page).locator('input:visible, select:visible').count()).toBeLessThanOrEqual(8);
  await field(page, 'system').focus();
  await page.keyboard.press('Tab');
  await page.keyboard.type('1,6 MVA');
  await page.keyboard.press('Tab');
  await page.keyboard.press('Tab'); // the fault level stays unknown
  await page.keyboard.type('360 MWh');
  await expect(form(page).locator('output')).toContainText(/900\skW/);
  await page.keyboard.press('Tab');
  await page.keyboard.type('270000');
  await page.keyboard.press('Tab');
  await page.keyboard.type('450 h');
  await expect(form(page).locator('output')).toContainText(/800\skW at cos φ 0\.8 · 337\skvar wanted/);
  await page.keyboard.press('Tab');
  await page.keyboard.type('25');
  await page.keyboard.press('Enter');

  await expect(form(page)).toBeHidden();
  await settled(page);
  await expect(page.locator('.header')).toContainText('Strong supply, 500 MVA');
  expect(await page.evaluate(() => document.activeElement?.closest('[data-drawing-pane]') !== null)).toBe(
    true,
  );
  const study = await savedStudy(page);
  expect(study.elements.map(({ kind }) => kind)).toEqual(
    expect.arrayContaining(['supply', 'transformer', 'motor', 'converter', 'bank']),
  );
  expect(study.cases).toHaveLength(2);
  const cosines = study.cases?.map(({ id }) => cosPhi(study, id, 'supply', 'intake')) ?? [];
  for (const cos of cosines) expect(cos).toBeGreaterThan(0.95);
  await expect(page.getByRole('region', { name: 'Notes' })).toContainText(`cos φ${cosines[0]?.toFixed(3)}`);

  await expect(list(page)).toContainText(/\d+ values to check/);
  await list(page)
    .getByRole('button', { name: /^load loss/ })
    .click();
  await expect(page.locator('.slip')).toContainText('transformer');
  await page.keyboard.press('Escape');
  await list(page)
    .getByRole('button', { name: /Put the list/ })
    .click();
  await expect(list(page)).toBeHidden();
});

test('the drawn site is one step: undo brings the form back as it was, redo the site', async ({ page }) => {
  await field(page, 'transformer').fill('630');
  await field(page, 'transformer').press('Enter');
  await settled(page);
  const drawn = await savedStudy(page);
  expect(await undoWords(page)).toBe('draw the site of the quick start');
  await page.keyboard.press('Control+z');
  await expect(field(page, 'transformer')).toHaveValue('630');
  await page.keyboard.press('Control+Shift+z');
  await settled(page);
  const again = await savedStudy(page);
  expect(again).toEqual(drawn);
});

test('errors are said at their field, and nothing is drawn until they are mended', async ({ page }) => {
  await field(page, 'transformer').fill('40 MVA');
  await field(page, 'transformer').press('Enter');
  await expect(form(page).getByRole('alert')).toContainText('allowed is a number from 25 kVA');
  await expect(form(page)).toBeVisible();
  await field(page, 'transformer').fill('250');
  await field(page, 'peak, or hours of use').fill('480');
  await field(page, 'peak, or hours of use').press('Enter');
  await expect(form(page).getByRole('alert')).toContainText('load this transformer with 226 %');
  await expect(form(page).getByRole('button', { name: 'Draw this site' })).toBeDisabled();
  await field(page, 'transformer').fill('800');
  await field(page, 'transformer').press('Enter');
  await settled(page);
  await expect(form(page)).toBeHidden();
});

test('the command begins a new study, and asks first where changes would be lost', async ({ page }) => {
  await field(page, 'transformer').press('Enter');
  await settled(page);
  await page.keyboard.press('Control+k');
  await page.keyboard.type('quick start');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('alertdialog')).toContainText('has changes that are in no file');
  await page.getByRole('button', { name: 'Leave the changes' }).click();
  await expect(field(page, 'system')).toBeFocused();
  await expect(field(page, 'transformer')).toHaveValue('');
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`form and list have no accessibility violations, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await field(page, 'transformer').fill('big');
    await field(page, 'transformer').press('Tab');
    await form(page).locator('summary').click();
    await accessible(page, 'form');
    await field(page, 'transformer').fill('1000');
    await field(page, 'transformer').press('Enter');
    await settled(page);
    await expect(list(page)).toBeVisible();
    await accessible(page, 'list');
  });
}
