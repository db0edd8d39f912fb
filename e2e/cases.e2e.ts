import AxeBuilder from '@axe-core/playwright';
import { expect, type Locator, type Page, test } from '@playwright/test';
import { deliveredKW } from './engineSays.ts';
import {
  note,
  openSampleSite,
  part,
  saveByDownload,
  savedStudy,
  settled,
  slipOf,
  undoWords,
} from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
});

const caseButton = (page: Page): Locator => page.locator('.case-name');
const margin = (page: Page): Locator => page.getByRole('complementary', { name: 'Margin' });

/** Sets p of the sample's plain bank to 7 %: its 400 V capacitors then stand at 430 V. */
async function detune(page: Page): Promise<void> {
  const slip = await slipOf(page, /Bank C1/);
  const field = slip.getByRole('textbox', { name: /^detuning p/ });
  await field.fill('7');
  await field.press('Enter');
  await page.keyboard.press('Escape');
  await settled(page);
}

test('a case is switched with one key, and drawing, rail and notes follow', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  await expect(part(page, /^motor, Compressors/)).not.toHaveAccessibleName(/in this case/);
  await page.keyboard.press(']');
  await expect(caseButton(page)).toContainText('Morning');
  await settled(page);
  await expect(part(page, /^motor, Compressors/)).toHaveAccessibleName(/in this case 55\s?% load/);
  await expect(part(page, /^bank, Bank C1/)).toContainText('Δ');
  await expect(page.locator('.rail-plot')).toContainText('parallel h 11.04');
  await expect(note(page, 'Intake · 11th harmonic current')).toBeVisible();
  await page.keyboard.press('[');
  await page.keyboard.press('[');
  await expect(caseButton(page)).toContainText('Night');
  await page.keyboard.press('k');
  await expect(page.getByRole('menu')).toBeVisible();
  await page.keyboard.press('1');
  await expect(page.getByRole('menu')).toBeHidden();
  await expect(caseButton(page)).toContainText('Day, all steps');
  await settled(page);
  await expect(page.locator('.rail-plot')).toContainText('parallel h 9.01');
});

test('what differs from the base study is listed, leads to its field, and is taken back by itself', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('x');
  const list = margin(page).getByRole('listbox', { name: /^Cases/ });
  await expect(list.getByRole('option', { name: /Day, all steps/ })).toBeFocused();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowDown');
  await expect(caseButton(page)).toContainText('Night, one step');
  const differences = margin(page).getByRole('region', { name: 'What differs in Night, one step' });
  await expect(differences.getByRole('button', { name: /becomes/ })).toHaveCount(4);
  await differences.getByRole('button', { name: /^load.*becomes 60/ }).click();
  const slip = page.getByRole('dialog', { name: /Compressors/ });
  await expect(slip.getByRole('textbox', { name: /^load/ })).toBeFocused();
  await page.keyboard.press('Escape');
  await differences.getByRole('button', { name: 'Take back: load of motor Compressors' }).click();
  await expect(differences.getByRole('button', { name: /becomes/ })).toHaveCount(3);
  await settled(page);
  const compressors = (await savedStudy(page)).cases?.[2]?.changes.find(({ element }) => element === 'comp');
  expect(compressors?.set).toEqual({ count: 2 });
  expect(await undoWords(page)).toBe(
    'put the load of motor Compressors back to the base study in case Night, one step',
  );
  await page.keyboard.press('Control+z');
  await expect(differences.getByRole('button', { name: /becomes/ })).toHaveCount(4);
  await list.focus();
  await page.keyboard.press('Escape');
  await expect(margin(page)).toBeHidden();
});

test('cases are put in another order by keys, and undo puts them back', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const names = async () => (await savedStudy(page)).cases?.map(({ id }) => id);
  await page.keyboard.press('x');
  await page.keyboard.press('Alt+ArrowDown');
  expect(await names()).toEqual(['two', 'day', 'one']);
  expect(await undoWords(page)).toBe('move case Day, all steps down');
  await page.keyboard.press('Control+z');
  expect(await names()).toEqual(['day', 'two', 'one']);
});

test('a common state is made from a case, previewed, and is an ordinary case afterwards', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('k');
  await page.getByRole('menuitem', { name: /^New case/ }).click();
  const form = page.getByRole('dialog', { name: 'New case' });
  await form.getByRole('radio', { name: /Light load/ }).click();
  await form.getByRole('textbox', { name: /loads at/ }).fill('20');
  await expect(form).toContainText('Compressors: Δ 16\u2009% load');
  await form.getByRole('button', { name: 'Add the case' }).click();
  await expect(caseButton(page)).toContainText('Light load, 20');
  await settled(page);
  const made = (await savedStudy(page)).cases?.at(-1);
  expect(made).toMatchObject({ role: 'light', name: 'Light load, 20\u2009%' });
  expect(made?.changes.find(({ element }) => element === 'comp')?.set).toEqual({ loadPercent: 16 });
  expect(await undoWords(page)).toBe('add case Light load, 20\u2009%');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).cases).toHaveLength(3);
});

test('two cases stand side by side with the engine’s own numbers, and are copied as text', async ({
  page,
  context,
}) => {
  await context.grantPermissions(['clipboard-read', 'clipboard-write']);
  await openSampleSite(page, 'cold-store');
  const study = await savedStudy(page);
  await page.keyboard.press(']');
  await settled(page);
  await part(page, /^busbar, Main board/).focus();
  await page.keyboard.press('v');
  const sheet = page.getByRole('region', { name: 'Day, all steps beside Morning, two of three steps' });
  await expect(sheet.getByRole('combobox', { name: 'First state' })).toBeFocused();
  const power = sheet.getByRole('row', { name: /Intake · active power into the site/ });
  for (const caseId of ['day', 'two'])
    await expect(power).toContainText(deliveredKW(study, caseId, 'supply', 'intake').toPrecision(4));
  await expect(sheet.getByRole('row', { name: /Compressors · harmonic voltage factor/ })).toContainText(
    'fails',
  );
  await sheet.getByRole('button', { name: 'copy table' }).click();
  const text = await page.evaluate(() => navigator.clipboard.readText());
  expect(text.split('\n')[0]).toBe(
    'quantity\tunit\tDay, all steps\tverdict\tmargin\tMorning, two of three steps\tverdict\tmargin\tchange',
  );
  await sheet.getByRole('combobox', { name: 'Second state' }).selectOption('Night, one step');
  await expect(page.getByRole('region', { name: 'Day, all steps beside Night, one step' })).toBeVisible();
  await page.getByRole('button', { name: 'drawings' }).click();
  await expect(page.getByRole('img', { name: 'Single-line diagram, Night, one step' })).toContainText('Δ');
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: 'drawings' })).toBeHidden();
  await expect(part(page, /^busbar, Main board/)).toBeFocused();
});

test('findings are walked by keys, lead to their field, and mend themselves undoably', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  await detune(page);
  await expect(page.getByRole('banner').getByRole('button', { name: /1 warning/ })).toBeVisible();
  await page.keyboard.press('!');
  const rows = margin(page).locator('.finding-jump');
  await expect(rows.first()).toBeFocused();
  await expect(rows.first()).toContainText('stand at 430\u2009V behind its 7\u2009% reactor');
  await page.keyboard.press('ArrowDown');
  await expect(rows.nth(1)).toBeFocused();
  await page.keyboard.press('Home');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('textbox', { name: /^rated voltage of the capacitors/ })).toBeFocused();
  await page.keyboard.press('Escape');
  await rows.first().focus();
  await page.keyboard.press('Tab');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('banner').getByRole('button', { name: /warning/ })).toBeHidden();
  await expect(rows.first()).toBeFocused();
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'c1')).toMatchObject({ ratedV: 440 });
  expect(await undoWords(page)).toBe('set the rated voltage of Bank C1 to 440\u2009V');
  await page.keyboard.press('Control+z');
  await expect(page.getByRole('banner').getByRole('button', { name: /1 warning/ })).toBeVisible();
  await page.keyboard.press('!');
  await expect(margin(page)).toBeHidden();
});

test('a finding about the study leads to its field among the details', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('Control+i');
  const demand = page.getByRole('textbox', { name: /maximum demand current/ });
  await demand.fill('');
  await demand.press('Enter');
  await page.getByRole('button', { name: 'Close' }).click();
  await page.keyboard.press('!');
  await margin(page)
    .getByRole('button', { name: /demand current I_?L/ })
    .first()
    .click();
  await expect(demand).toBeFocused();
});

test('the counts switch the notes between this case and every case', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const inAll = page.getByRole('button', { name: /\d+ in all/ });
  await inAll.click();
  await expect(inAll).toHaveAttribute('aria-pressed', 'true');
  const other = note(page, 'Morning, two of three steps: Compressors · harmonic voltage factor');
  await other.getByRole('button').first().click();
  await expect(caseButton(page)).toContainText('Morning');
  await page.getByRole('button', { name: 'this case alone' }).click();
  await expect(page.getByRole('button', { name: /fail in this case/ })).toHaveAttribute(
    'aria-pressed',
    'true',
  );
  await expect(note(page, 'Compressors · harmonic voltage factor')).toBeVisible();
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`no accessibility violations in margin, forms and comparison, ${colorScheme}`, async ({ browser }) => {
    test.setTimeout(240_000);
    const context = await browser.newContext({ colorScheme, reducedMotion: 'reduce' });
    const page = await context.newPage();
    await openSampleSite(page, 'cold-store');
    await detune(page);
    const look = async (where: string) => {
      const { violations } = await new AxeBuilder({ page })
        .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
        .analyze();
      expect(
        violations.map(({ id, nodes }) => `${where}: ${id}: ${nodes.map((one) => one.html).join(' | ')}`),
      ).toEqual([]);
    };
    await page.keyboard.press('!');
    await expect(margin(page)).toBeVisible();
    await look('findings');
    await page.keyboard.press(']');
    await page.keyboard.press('x');
    await look('cases');
    await margin(page).getByRole('button', { name: 'New case…' }).click();
    await page.getByRole('radio', { name: /Light load/ }).click();
    await look('new case');
    await page.keyboard.press('Escape');
    await page.keyboard.press('v');
    await expect(page.getByRole('row', { name: /Intake · active power/ })).toBeVisible();
    await look('numbers beside each other');
    await page.getByRole('button', { name: 'drawings' }).click();
    await look('drawings beside each other');
    await context.close();
  });
}
