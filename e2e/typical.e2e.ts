import { expect, test } from '@playwright/test';
import { openSampleSite, saveByDownload, savedStudy, settled, slipOf, undoWords } from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
});

test('typical values are set on request, as one step of undo, and stay marked with their source', async ({
  page,
}) => {
  const before = await savedStudy(page);
  const slip = await slipOf(page, /^transformer, T1/);
  await slip.getByText('typical values…').click();
  await slip.getByLabel('filling').selectOption('dry');
  await slip.getByRole('button', { name: 'Use these, marked typical' }).click();
  await settled(page);
  const after = await savedStudy(page);
  // Regulation (EU) 548/2014, Annex I, Table I.2, tier 2; u_k of IEC 60076-5, Table 1, from memory.
  expect(after.elements.find(({ id }) => id === 't1')).toMatchObject({
    loadLossKW: 9,
    noLoadLossKW: 1.395,
    ukPercent: 5,
  });
  expect(after.origins?.['elements.t1.loadLossKW']).toMatchObject({
    origin: 'typical',
    note: expect.stringContaining('548/2014'),
  });
  await page.keyboard.press('Escape');
  expect(await undoWords(page)).toBe('set typical values of transformer T1');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(before.elements);
});

test('what lies outside the tables is refused with the permitted range', async ({ page }) => {
  const slip = await slipOf(page, /^motor, Compressors/);
  await slip.getByLabel('rated shaft power, each', { exact: true }).fill('400');
  await page.keyboard.press('Enter');
  await slip.getByText('typical values…').click();
  await expect(slip.getByRole('alert')).toContainText('allowed is 0.12 to 200 kW');
  await expect(slip.getByRole('button', { name: 'Use these, marked typical' })).toBeHidden();
});

test('a cable offers the cross-section nearest to what it has', async ({ page }) => {
  const slip = await slipOf(page, /^cable, W2/);
  await slip.getByText('typical values…').click();
  await expect(slip.getByLabel('cross-section')).toHaveValue('240');
  await slip.getByLabel('cross-section').selectOption('95');
  await slip.getByLabel('conductor', { exact: true }).selectOption('aluminium');
  await slip.getByRole('button', { name: 'Use these, marked typical' }).click();
  await settled(page);
  // IEC 60228, Table 2: 0.320 Ω/km at 20 °C, times 1.2 at 70 °C.
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'w2')).toMatchObject({
    resistanceOhmPerKm: 0.384,
    reactanceOhmPerKm: 0.08,
  });
});

test('a drive takes the spectrum of its build, a bank the rated voltage it needs behind its reactor', async ({
  page,
}) => {
  const fans = await slipOf(page, /Fans/);
  await fans.getByText('typical values…').click();
  await fans.getByLabel('build').selectOption('choke-5');
  await fans.getByRole('button', { name: 'Use these, marked typical' }).click();
  await page.keyboard.press('Escape');
  const bank = await slipOf(page, /^bank, Bank C1/);
  await bank.getByText('typical values…').click();
  await bank.getByLabel('detuned by').selectOption('7');
  await expect(bank.getByText(/rated at 480.V give/)).toBeVisible();
  await bank.getByRole('button', { name: 'Use these, marked typical' }).click();
  await settled(page);
  const after = await savedStudy(page);
  expect(after.elements.find(({ id }) => id === 'fans')).toMatchObject({ spectrum: 'drive-reactance-5' });
  expect(after.origins?.['elements.fans.spectrum']?.note).toContain('5 % total input reactance');
  // U_C = U/(1 − p) = 430 V at 400 V and 7 %, 473 V with the supply at +10 %: common practice.
  expect(after.elements.find(({ id }) => id === 'c1')).toMatchObject({ detuningPercent: 7, ratedV: 480 });
});
