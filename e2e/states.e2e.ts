import { expect, test } from '@playwright/test';
import { openSampleSite } from './workbench.ts';

test('the worst over every step combination and tolerance is found, explained and made a case', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('%');
  const margin = page.getByRole('complementary', { name: 'Margin' });
  await expect(margin.getByText(/12 states and their tolerances, \d+ points solved: done/)).toBeVisible({
    timeout: 45_000,
  });
  const worst = margin.getByRole('region', { name: 'The worst of all' });
  const named = { name: /^fails Bank C1 · bank current/ };
  const bank = worst.getByRole('button', named);
  await expect(bank).toContainText('limit 1.3');
  const place = worst
    .getByRole('listitem')
    .filter({ has: page.getByRole('button', named) })
    .first();
  await expect(place).toContainText('capacitance of Bank C1');

  await bank.click();
  await expect(page.getByRole('button', { name: /^Bank C1/ }).first()).toBeVisible();

  const shownCase = page.getByRole('banner').locator('.case-name');
  await place.getByRole('button', { name: 'make this state a case' }).click();
  await expect(shownCase).toContainText('Bank C1 at');
  await page.keyboard.press('Control+z');
  await expect(shownCase).not.toContainText('Bank C1 at');
});

test('families and tolerances are chosen by keyboard, and the count of states follows at once', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('%');
  const margin = page.getByRole('complementary', { name: 'Margin' });
  await margin.getByText('What is searched').focus();
  await page.keyboard.press('Enter');
  await margin.getByLabel('every step combination of every bank').focus();
  await page.keyboard.press('Space');
  await margin.getByLabel('Tolerances, searched in every state').focus();
  await page.keyboard.press('Space');
  await expect(margin.getByText('3 states at rated values: done.')).toBeVisible({ timeout: 30_000 });
  await page.keyboard.press('Escape');
  await expect(margin).toBeHidden();
});
