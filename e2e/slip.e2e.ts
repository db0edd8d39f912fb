import { expect, type Locator, type Page, test } from '@playwright/test';
import type { StudyElement } from '../src/study/index.ts';
import {
  note,
  openSampleSite,
  part,
  rail,
  saveByDownload,
  savedStudy,
  settled,
  slipOf,
  undoWords,
} from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
});

async function type(page: Page, field: Locator, text: string): Promise<void> {
  await field.fill(text);
  await page.keyboard.press('Enter');
}

async function elementOf(page: Page, id: string): Promise<StudyElement | undefined> {
  return (await savedStudy(page)).elements.find((element) => element.id === id);
}

test('a field takes a decimal comma, a prefix, another unit and arithmetic, and says what it understood', async ({
  page,
}) => {
  const slip = await slipOf(page, /^transformer, T1/);
  const power = slip.getByLabel('rated power', { exact: true });
  await type(page, power, '1,25 MVA');
  await settled(page);
  expect(await elementOf(page, 't1')).toMatchObject({ ratedKVA: 1250 });
  await power.fill('2*630');
  await expect(slip.getByRole('status')).toContainText('1 260 kVA');
  await page.keyboard.press('Enter');
  await settled(page);
  expect(await elementOf(page, 't1')).toMatchObject({ ratedKVA: 1260 });
  await type(page, slip.getByLabel(/^rated low voltage/), '0,4 kV');
  expect(await elementOf(page, 't1')).toMatchObject({ lvV: 400 });
  await page.keyboard.press('Escape');
  await expect(slip).toBeHidden();
  expect(await undoWords(page)).toBe('set the rated power of transformer T1');
});

test('a wrong entry is said at the field and changes nothing; Escape puts the old value back', async ({
  page,
}) => {
  const before = await savedStudy(page);
  const slip = await slipOf(page, /^transformer, T1/);
  const power = slip.getByLabel('rated power', { exact: true });
  await type(page, power, '12 bananas');
  await expect(slip.getByRole('alert')).toContainText('kVA');
  await expect(power).toHaveAttribute('aria-invalid', 'true');
  await expect(power).toBeFocused();
  await expect(power).toHaveValue('12 bananas');
  await type(page, power, '-5');
  await expect(slip.getByRole('alert')).toContainText('allowed');
  await page.keyboard.press('Escape');
  await expect(slip).toBeHidden();
  await expect(part(page, /^transformer, T1/)).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(power).toHaveValue('1000');
  await page.keyboard.press('Escape');
  expect(await savedStudy(page)).toEqual(before);
});

test('Enter goes from essential field to essential field, back with Shift, and past the last to the part', async ({
  page,
}) => {
  const slip = await slipOf(page, /^motor, Compressors/);
  const stops = ['rated shaft power, each', 'number of motors', 'load', 'power factor cos φ', 'efficiency η'];
  const stop = (label: string) => slip.getByLabel(label, { exact: true });
  await expect(stop('rated shaft power, each')).toBeFocused();
  await page.keyboard.type('75');
  for (const label of stops.slice(1)) {
    await page.keyboard.press('Enter');
    await expect(stop(label)).toBeFocused();
  }
  await page.keyboard.press('Shift+Enter');
  await expect(stop('power factor cos φ')).toBeFocused();
  await page.keyboard.type('0,86');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await expect(slip).toBeHidden();
  await expect(part(page, /^motor, Compressors/)).toBeFocused();
  await settled(page);
  expect(await elementOf(page, 'comp')).toMatchObject({ ratedKW: 75, powerFactor: 0.86 });
  await page.keyboard.press('Enter');
  await expect(stop('rated shaft power, each')).toBeFocused();
  await page.keyboard.press('Shift+Enter');
  await expect(slip.getByLabel('Name', { exact: true })).toBeFocused();
  await page.keyboard.type('Screw compressors');
  await page.keyboard.press('Control+Enter');
  await expect(slip).toBeHidden();
  await expect(part(page, /^motor, Screw compressors/)).toBeFocused();
});

test('the fold of further data stays as it was left, for that kind of part', async ({ page }) => {
  const slip = await slipOf(page, /^motor, Compressors/);
  const ratio = slip.getByLabel(/^starting current ratio/);
  await expect(ratio).toBeHidden();
  await slip.getByText('more data').click();
  await expect(ratio).toBeVisible();
  await page.keyboard.press('Escape');
  await page.reload();
  await openSampleSite(page, 'cold-store');
  await slipOf(page, /^motor, Compressors/);
  await expect(ratio).toBeVisible();
  await page.keyboard.press('Escape');
  await slipOf(page, /^transformer, T1/);
  await expect(slip.getByLabel('no-load loss P_0', { exact: true })).toBeHidden();
});

test('steps are written at once as 6x25 and switched one by one', async ({ page }) => {
  const slip = await slipOf(page, /^bank, Bank C1/);
  await type(page, slip.getByLabel('steps', { exact: true }), '6x25');
  await expect(slip.getByText(/150\skvar of 150\skvar/)).toBeVisible();
  await slip.getByLabel('Step 2 switched in').uncheck();
  await expect(slip.getByText(/125\skvar of 150\skvar/)).toBeVisible();
  await settled(page);
  const bank = await elementOf(page, 'c1');
  expect(bank?.kind === 'bank' && bank.steps.map(({ kvar, on }) => [kvar, on ?? true])).toEqual([
    [25, true],
    [25, false],
    [25, true],
    [25, true],
    [25, true],
    [25, true],
  ]);
});

test('a drive takes a built-in spectrum, or rows of its own that can be edited', async ({ page }) => {
  const slip = await slipOf(page, /Fans/);
  await slip.getByRole('button', { name: 'Edit a copy of these rows' }).click();
  await expect(slip.getByLabel('spectrum', { exact: true })).toHaveValue(/rows$/);
  const percent = slip.locator('table input').nth(1);
  await type(page, percent, '33,5');
  await settled(page);
  const own = await elementOf(page, 'fans');
  expect(own?.kind === 'converter' && typeof own.spectrum !== 'string' && own.spectrum[0]?.percent).toBe(
    33.5,
  );
  await slip.getByLabel('spectrum', { exact: true }).selectOption({ index: 1 });
  await settled(page);
  const named = await elementOf(page, 'fans');
  expect(named?.kind === 'converter' && typeof named.spectrum).toBe('string');
});

test('a change for one case leaves the base study alone and can be taken back', async ({ page }) => {
  const before = await elementOf(page, 't1');
  await page.keyboard.press('F8');
  await settled(page);
  const slip = await slipOf(page, /^transformer, T1/);
  await slip.getByLabel('change in Morning, two of three steps only').check();
  await type(page, slip.getByLabel('rated power', { exact: true }), '800');
  await settled(page);
  const study = await savedStudy(page);
  expect(study.elements.find(({ id }) => id === 't1')).toEqual(before);
  expect(study.cases?.find(({ id }) => id === 'two')?.changes).toContainEqual({
    element: 't1',
    set: { ratedKVA: 800 },
  });
  await slip.getByRole('button', { name: 'back to base' }).click();
  await settled(page);
  expect((await savedStudy(page)).cases?.find(({ id }) => id === 'two')?.changes).not.toContainEqual(
    expect.objectContaining({ element: 't1' }),
  );
});

test('the origin of a value is set by mouse or by its first letter, with a date and a note', async ({
  page,
}) => {
  const slip = await slipOf(page, /^transformer, T1/);
  const power = slip.getByLabel('rated power', { exact: true });
  const mark = slip.getByRole('combobox', { name: 'Origin of rated power' });
  await expect(mark).toHaveValue('nameplate');
  await mark.focus();
  await mark.selectOption('assumed');
  await expect(slip.getByLabel('Date of rated power')).toBeVisible();
  await power.focus();
  await page.keyboard.press('Tab');
  await expect(mark).toBeFocused();
  await page.keyboard.press('m');
  await expect(mark).toHaveValue('measured');
  await page.keyboard.press('Tab');
  await expect(slip.getByLabel('Date of rated power')).toBeFocused();
  await page.keyboard.type('31.01.2026');
  await page.keyboard.press('Enter');
  await expect(slip.getByRole('alert')).toContainText('"31.01.2026" is no date');
  await slip.getByLabel('Date of rated power').fill('2026-01-31');
  await page.keyboard.press('Enter');
  await expect(slip.getByLabel('Note on rated power')).toBeFocused();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('photo of the plate');
  await page.keyboard.press('Enter');
  await expect(slip.getByLabel(/^impedance voltage/)).toBeFocused();
  await settled(page);
  expect((await savedStudy(page)).origins?.['elements.t1.ratedKVA']).toEqual({
    origin: 'measured',
    date: '2026-01-31',
    note: 'photo of the plate',
  });
});

test('typical values are counted on the slip and confirmed as nameplate data in one step', async ({
  page,
}) => {
  const slip = await slipOf(page, /^transformer, T1/);
  await slip.getByText('typical values…').click();
  await slip.getByRole('button', { name: 'Use these, marked typical' }).click();
  await expect(slip.getByText(/\d+ typical/)).toBeVisible();
  await slip.getByRole('button', { name: 'Confirm as nameplate' }).click();
  await expect(slip.getByRole('button', { name: 'Confirm as nameplate' })).toBeHidden();
  await settled(page);
  expect((await savedStudy(page)).origins?.['elements.t1.loadLossKW']).toMatchObject({ origin: 'nameplate' });
  await page.keyboard.press('Escape');
  expect(await undoWords(page)).toBe('confirm typical values of transformer T1 as nameplate data');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).origins?.['elements.t1.loadLossKW']?.origin).toBe('typical');
});

test('a current pinned from the slip stands among the notes until it is unpinned', async ({ page }) => {
  const slip = await slipOf(page, /^motor, Compressors/);
  await slip.getByRole('button', { name: 'Pin current' }).click();
  const pinned = note(page, 'Compressors · current');
  await expect(pinned).toBeVisible();
  await slip.getByRole('button', { name: 'Unpin current' }).click();
  await expect(pinned).toBeHidden();
});

test('a note widens to a lens over the paper, and a verdict leads to its part and order', async ({
  page,
}) => {
  const reading = note(page, 'Intake · current from Supply');
  await reading.getByRole('button', { name: 'What can be done with this note' }).click();
  await page.getByRole('menuitem', { name: /^Widen to a lens/ }).click();
  await expect(reading).toBeInViewport({ ratio: 0.99 });
  expect((await reading.boundingBox())?.width).toBeGreaterThan(600);
  await reading.getByRole('button', { name: 'Intake · current from Supply' }).press('l');
  await expect.poll(async () => (await reading.boundingBox())?.width).toBeLessThan(500);
  await page.keyboard.press('F8');
  await settled(page);
  const verdict = note(page, 'Intake · 11th harmonic current at the PCC');
  await verdict.getByRole('button', { name: 'jump to the part' }).click();
  await expect(part(page, /^busbar, Intake/)).toHaveAttribute('aria-pressed', 'true');
  await expect(rail(page)).toHaveAttribute('aria-valuenow', '11');
});

/** Pastes text into the field with the focus, as from a spreadsheet. */
async function pasteText(page: Page, text: string): Promise<void> {
  await page.evaluate((pasted) => {
    const data = new DataTransfer();
    data.setData('text', pasted);
    document.activeElement?.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
    );
  }, text);
}

test('a spectrum copied from a sheet replaces the rows, amperes are brought to per cent, and a wrong line is named', async ({
  page,
}) => {
  const slip = await slipOf(page, /Fans/);
  await slip.getByRole('button', { name: 'Edit a copy of these rows' }).click();
  await slip.locator('table input').first().focus();
  await pasteText(page, 'Order\tA\tAngle\n1\t250\t0\n5\t95,5\t174\n7\t35,25\t-\n');
  await expect(slip.getByRole('status').filter({ hasText: '2 rows pasted' })).toContainText('Order 1 is 250');
  await settled(page);
  expect(await elementOf(page, 'fans')).toMatchObject({
    spectrum: [
      { h: 5, percent: 38.2, angleDeg: 174 },
      { h: 7, percent: 14.1 },
    ],
  });
  await slip.locator('table input').first().focus();
  await pasteText(page, '5\t20\nTHD\t44');
  await expect(slip.getByRole('alert')).toContainText('Line 2: "THD" is no whole order');
  expect(await elementOf(page, 'fans')).toMatchObject({ spectrum: [{ h: 5, percent: 38.2 }, { h: 7 }] });
});

test('steps copied from a sheet are listed, and several values never run together in one field', async ({
  page,
}) => {
  const slip = await slipOf(page, /^bank, Bank C1/);
  const steps = slip.getByLabel('steps', { exact: true });
  await steps.focus();
  await pasteText(page, 'number\tkvar\n2\t12,5\n4\t25\n');
  await expect(steps).toHaveValue('2 × 12,5; 4 × 25');
  await page.keyboard.press('Enter');
  await expect(slip.getByText(/125\skvar of 125\skvar/)).toBeVisible();
  const volts = slip.getByLabel('rated voltage of the capacitors', { exact: true });
  await expect(volts).toBeFocused();
  await pasteText(page, '440\n480');
  await expect(slip.getByRole('alert')).toContainText('this field takes one');
  await expect(volts).toHaveValue('400');
});
