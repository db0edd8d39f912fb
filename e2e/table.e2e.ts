import AxeBuilder from '@axe-core/playwright';
import { expect, type Locator, type Page, test } from '@playwright/test';
import type { StudyElement } from '../src/study/index.ts';
import { openSampleSite, part, saveByDownload, savedStudy, settled, undoWords } from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
});

function table(page: Page): Locator {
  return page.getByRole('grid');
}

/** A cell by the name of its row and the words of its column's head. */
async function cell(page: Page, row: string, head: string): Promise<Locator> {
  const heads = await table(page).getByRole('columnheader').allTextContents();
  const at = heads.findIndex((text) => text.startsWith(head));
  return table(page)
    .getByRole('row')
    .filter({ has: page.getByRole('rowheader', { name: row }) })
    .locator('[role="rowheader"], [role="gridcell"]')
    .nth(at);
}

async function openTable(page: Page, owner: string): Promise<void> {
  await page.keyboard.press('F7');
  await expect(table(page)).toBeVisible();
  await page.getByLabel('Table of', { exact: true }).selectOption(owner);
}

/** Pastes text where the keyboard is, as from a spreadsheet. */
async function pasteText(page: Page, text: string): Promise<void> {
  await page.evaluate((pasted) => {
    const data = new DataTransfer();
    data.setData('text', pasted);
    const event = new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
  }, text);
}

async function motors(page: Page): Promise<StudyElement[]> {
  return (await savedStudy(page)).elements.filter(({ kind }) => kind === 'motor');
}

test('three motors are entered by keyboard alone, and each step can be undone by name', async ({ page }) => {
  await openTable(page, 'motor');
  await (await cell(page, 'Compressors', 'name')).click();
  for (const [name, kW, count] of [
    ['Pump 1', '30', '2'],
    ['Pump 2', '2*22,5', ''],
    ['Fan', '0,011 MW', '3'],
  ] as const) {
    await page.keyboard.press('Control+End');
    await page.keyboard.press('ArrowDown');
    await expect(page.getByRole('button', { name: '+ new motor' })).toBeFocused();
    await page.keyboard.press('Enter');
    await page.keyboard.type(name);
    await page.keyboard.press('Tab');
    await page.keyboard.press('Tab');
    await page.keyboard.type(kW);
    await page.keyboard.press('Tab');
    if (count) await page.keyboard.type(count);
    await page.keyboard.press(count ? 'Enter' : 'Home');
  }
  await settled(page);
  expect((await motors(page)).slice(1)).toMatchObject([
    { name: 'Pump 1', bus: 'main', ratedKW: 30, count: 2 },
    { name: 'Pump 2', ratedKW: 45 },
    { name: 'Fan', ratedKW: 11, count: 3 },
  ]);
  await (await cell(page, 'Fan', 'name')).click();
  expect(await undoWords(page)).toBe('set the number of motors of motor Fan');
  await page.keyboard.press('Control+z');
  await expect(await cell(page, 'Fan', 'number of motors')).toHaveText('1');
  await page.keyboard.press('Control+Shift+z');
  await expect(await cell(page, 'Fan', 'number of motors')).toHaveText('3');
});

test('a cell is written over by typing, opened by F2, put back by Escape, and refuses what its field refuses', async ({
  page,
}) => {
  const before = await savedStudy(page);
  await openTable(page, 'motor');
  const power = await cell(page, 'Compressors', 'rated shaft power');
  await power.click();
  await expect(power).toBeFocused();
  await page.keyboard.type('0,1 MW');
  const editor = page.getByRole('textbox', { name: 'rated shaft power, each of Compressors' });
  await expect(table(page).getByRole('status')).toContainText('= 100 kW');
  await page.keyboard.press('Escape');
  await expect(power).toContainText('90');
  await expect(power).toBeFocused();
  await page.keyboard.press('F2');
  await expect(editor).toHaveValue('90');
  await editor.fill('-5');
  await page.keyboard.press('Enter');
  await expect(table(page).getByRole('alert')).toContainText('−5 kW is not possible here; allowed is');
  await expect(editor).toBeFocused();
  await expect(editor).toHaveValue('-5');
  await page.keyboard.press('Escape');
  await page.keyboard.press('Delete');
  await expect(page.getByRole('alert')).toContainText('is needed');
  expect(await savedStudy(page)).toEqual(before);
  await power.click();
  await page.keyboard.type('110');
  await page.keyboard.press('Tab');
  await expect(await cell(page, 'Compressors', 'number of motors')).toBeFocused();
  await settled(page);
  expect((await motors(page))[0]).toMatchObject({ ratedKW: 110 });
  await page.keyboard.press('Escape');
  await expect(page.getByLabel('Find in the table')).toBeFocused();
  await page.keyboard.press('Escape');
  await expect(part(page, /^motor, Compressors/)).toBeVisible();
});

test('heads sort, words and origins filter, and a row being written in stays where it is', async ({
  page,
}) => {
  await openTable(page, 'converter');
  const names = async () =>
    (await table(page).getByRole('rowheader').allTextContents()).map(
      (text) => /^[A-Z][a-z]+/.exec(text)?.[0],
    );
  expect(await names()).toEqual(['Fans', 'Pumps', 'Hoist']);
  await table(page)
    .getByRole('columnheader', { name: /^active power/ })
    .click();
  expect(await names()).toEqual(['Hoist', 'Pumps', 'Fans']);
  await (await cell(page, 'Hoist', 'active power')).click();
  await page.keyboard.type('500');
  await page.keyboard.press('Enter');
  expect(await names()).toEqual(['Hoist', 'Pumps', 'Fans']);
  await table(page)
    .getByRole('columnheader', { name: /^active power/ })
    .click();
  expect(await names()).toEqual(['Hoist', 'Fans', 'Pumps']);
  await page.getByLabel('Find in the table').fill('5 % input');
  await expect(table(page).getByRole('rowheader')).toHaveText([/^Pumps/]);
  await page.getByLabel('Find in the table').fill('');
  await (await cell(page, 'Fans', 'active power')).click();
  await page.keyboard.press('Alt+a');
  await page.getByLabel('Rows with values of').selectOption('open');
  await expect(table(page).getByRole('rowheader')).toHaveText([/^Fans/, /^Pumps/]);
  expect((await savedStudy(page)).origins?.['elements.fans.kW']).toMatchObject({ origin: 'assumed' });
});

test('marked cells are copied, filled down, emptied and given an origin as one step each', async ({
  page,
}) => {
  await openTable(page, 'converter');
  await (await cell(page, 'Fans', 'displacement')).click();
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Shift+ArrowDown');
  await page.keyboard.press('Control+d');
  await settled(page);
  const factors = async () =>
    (await savedStudy(page)).elements.flatMap((one) => (one.kind === 'converter' ? [one.powerFactor] : []));
  expect(await factors()).toEqual([0.96, 0.96, 0.96]);
  await page.keyboard.press('Alt+m');
  const { origins } = await savedStudy(page);
  expect(['fans', 'pumps', 'hoist'].map((id) => origins?.[`elements.${id}.powerFactor`]?.origin)).toEqual([
    'measured',
    'measured',
    'measured',
  ]);
  expect(await undoWords(page)).toBe('note the origin of 3 values');
  const copied = await page.evaluate(() => {
    const data = new DataTransfer();
    const event = new ClipboardEvent('copy', { clipboardData: data, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
    return data.getData('text/plain');
  });
  expect(copied).toBe('0.96\n0.96\n0.96');
  await page.keyboard.press('Control+z');
  await page.keyboard.press('Control+z');
  expect(await factors()).toEqual([0.96, 0.95, 0.99]);
});

const sheet = [
  'Tag\tBoard\tPower [W]\tcos φ\tQty\tRemark',
  'Compressors\tMain board\t90\u00a0000\t0,84\t5\trebuilt',
  '"Brine ""pump"""\tMain board\t7.500,0\t0,8\t2\t',
  '',
  'Conveyor\tRoof\t4\u2009000\t0,78\t1\t',
  'Lift\tMain board\tabout 11\t0,8\t1\t',
].join('\r\n');

test('a table from a spreadsheet is shown as it is read, mended, and taken as one step', async ({ page }) => {
  const before = await savedStudy(page);
  await openTable(page, 'motor');
  await (await cell(page, 'Compressors', 'name')).click();
  await pasteText(page, sheet);
  const panel = page.getByRole('region', { name: 'Paste from a sheet' });
  await expect(panel.getByRole('status')).toContainText('4 rows: 2 new, 1 changed, 1 refused');
  await expect(panel.getByRole('status')).toContainText('1 blank line passed over');
  await expect(panel.getByRole('status')).toContainText('Left out: Remark');
  await expect(panel.getByLabel('Column Power [W] is')).toHaveValue('ratedKW');
  await expect(panel.getByText('in W, to kW')).toBeVisible();
  await expect(panel.getByRole('row', { name: /changes Compressors/ })).toContainText('0.84');
  await expect(panel.getByRole('row', { name: /new: Brine "pump"/ })).toContainText('7.5');
  await expect(
    panel.getByText('There is no busbar "Roof"; the study has Intake, Main board, Drives board.'),
  ).toBeVisible();
  await expect(
    panel.getByRole('button', { name: 'Take 3 rows without 1 value that cannot be read and 1 refused row' }),
  ).toBeVisible();
  await panel.getByLabel('Line 5, busbar').fill('drives');
  await panel.getByLabel('Line 6, rated shaft power, each').fill('11 kW');
  await panel.getByLabel('Use line 3').uncheck();
  await panel.getByLabel('values are').selectOption('nameplate');
  await panel.getByRole('button', { name: 'Take 3 rows', exact: true }).click();
  await expect(table(page)).toBeVisible();
  await settled(page);
  const after = await savedStudy(page);
  expect(after.elements.filter(({ kind }) => kind === 'motor')).toMatchObject([
    { name: 'Compressors', powerFactor: 0.84 },
    { name: 'Conveyor', bus: 'drives', ratedKW: 4, powerFactor: 0.78 },
    { name: 'Lift', bus: 'main', ratedKW: 11 },
  ]);
  const lift = after.elements.find(({ name }) => name === 'Lift');
  expect(after.origins?.[`elements.${lift?.id}.ratedKW`]).toEqual({ origin: 'nameplate' });
  await (await cell(page, 'Lift', 'name')).click();
  expect(await undoWords(page)).toBe('paste 3 motors: 2 new, 1 changed');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(before.elements);
});

test('columns without heads follow the cell they are pasted at, and can be told otherwise', async ({
  page,
}) => {
  await openTable(page, 'converter');
  await (await cell(page, 'Fans', 'active power')).click();
  await pasteText(page, '80\t0.9\n60\t0.91\n');
  const panel = page.getByRole('region', { name: 'Paste from a sheet' });
  await expect(panel.getByLabel('Column 1 is')).toHaveValue('kW');
  await expect(panel.getByLabel('Column 2 is')).toHaveValue('powerFactor');
  await expect(panel.getByRole('row', { name: /changes Pumps/ })).toContainText('0.91');
  await panel.getByLabel('Column 1 is').selectOption('');
  await panel.getByRole('button', { name: 'Take 2 rows' }).click();
  await settled(page);
  const { elements } = await savedStudy(page);
  expect(elements.find(({ id }) => id === 'fans')).toMatchObject({ kW: 88, powerFactor: 0.9 });
  await (await cell(page, 'Hoist', 'active power')).click();
  await pasteText(page, '30 kW\n');
  await expect(await cell(page, 'Hoist', 'active power')).toHaveText(/^30(?!\d)/);
  await pasteText(page, '80\t0.9\n60\t0.91\n');
  await page.keyboard.press('Escape');
  await expect(await cell(page, 'Hoist', 'active power')).toBeFocused();
});

test('in an operating state the table says where edits go, as the slip does', async ({ page }) => {
  await page.keyboard.press('F8');
  await settled(page);
  await openTable(page, 'motor');
  await expect(page.getByText('edits go to the base study')).toBeVisible();
  await page.getByLabel('change in Morning, two of three steps only').check();
  await expect(page.getByText('edits go to Morning, two of three steps')).toBeVisible();
  const load = await cell(page, 'Compressors', 'load');
  await load.click();
  const before = (await motors(page))[0];
  await page.keyboard.type('31');
  await page.keyboard.press('Enter');
  await settled(page);
  const study = await savedStudy(page);
  expect(study.elements.find(({ id }) => id === 'comp')).toEqual(before);
  expect(study.cases?.find(({ id }) => id === 'two')?.changes).toContainEqual(
    expect.objectContaining({ element: 'comp', set: expect.objectContaining({ loadPercent: 31 }) }),
  );
  await expect(load).toHaveAttribute('title', /base: 80/);
  await page.getByLabel('change in Morning, two of three steps only').uncheck();
  await expect(load).toContainText('80');
});

test('busbars are a table too, and a part is shown on the drawing with its data', async ({ page }) => {
  await openTable(page, 'bus');
  await (await cell(page, 'Main board', 'nominal voltage')).click();
  await page.keyboard.type('0.69 kV');
  await page.keyboard.press('Enter');
  await settled(page);
  expect((await savedStudy(page)).buses.find(({ id }) => id === 'main')).toMatchObject({ nominalV: 690 });
  await page.keyboard.press('Control+z');
  await page.keyboard.press('Control+Enter');
  await expect(page.locator('.slip')).toContainText('busbar');
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`table and paste are without accessibility violations, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await openTable(page, 'motor');
    await (await cell(page, 'Compressors', 'rated shaft power')).click();
    const violations = async () => {
      const { violations: found } = await new AxeBuilder({ page })
        .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
        .analyze();
      return found.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.html).join(' | ')}`);
    };
    expect(await violations()).toEqual([]);
    await page.keyboard.type('-5');
    await page.keyboard.press('Enter');
    expect(await violations()).toEqual([]);
    await page.keyboard.press('Escape');
    await pasteText(page, sheet);
    expect(await violations()).toEqual([]);
  });
}
