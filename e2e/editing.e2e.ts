import { expect, test } from '@playwright/test';
import {
  carry,
  carryFromTray,
  middle,
  openSampleSite,
  part,
  rail,
  saveByDownload,
  savedStudy,
  settled,
  under,
  undoWords,
} from './workbench.ts';

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
});

test('a part of every kind hangs from the busbar it is dropped on', async ({ page }) => {
  await page.goto('/');
  await carryFromTray(page, 'supply', { x: 600, y: 200 });
  await expect(page.locator('output.plan')).toHaveText('supply with its busbar');
  await page.mouse.up();
  const intake = part(page, /^busbar, Intake/);
  await expect(intake).toBeVisible();
  await carryFromTray(page, 'transformer', await under(intake, 0.5));
  await page.mouse.up();
  const board = part(page, /^busbar, 400 V busbar/);
  await expect(board).toBeVisible();
  for (const kind of ['motor', 'converter', 'load', 'bank', 'filter', 'shunt', 'generator', 'cable']) {
    await carryFromTray(page, kind, await under(board.first(), 0.9));
    await page.mouse.up();
  }
  await settled(page);
  const study = await savedStudy(page);
  const [first, second] = study.buses;
  expect(study.elements.map((element) => element.kind)).toEqual([
    'supply',
    'transformer',
    'motor',
    'converter',
    'load',
    'bank',
    'filter',
    'shunt',
    'generator',
    'cable',
  ]);
  expect(study.elements[1]).toMatchObject({ from: first?.id, to: second?.id });
  for (const hung of study.elements.slice(2, -1)) expect(hung).toMatchObject({ bus: second?.id });
  expect(study.buses).toHaveLength(3);
});

test('Escape ends a drop, a move and an end in the hand without a trace', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const before = await savedStudy(page);
  const main = part(page, /^busbar, Main board/);
  const drives = part(page, /^busbar, Drives board/);

  await carryFromTray(page, 'bank', await under(main, 0.7));
  await expect(page.locator('output.plan')).toHaveText('hang bank on Main board');
  await page.keyboard.press('Escape');
  await expect(page.locator('output.plan')).toHaveText('');
  await page.mouse.up();

  await carry(
    page,
    await middle(
      part(page, /^bank, Bank C1/)
        .locator('.hit')
        .first(),
    ),
    await under(drives, 0.5),
  );
  await expect(page.locator('output.plan')).toHaveText('hang Bank C1 on Drives board');
  await page.keyboard.press('Escape');
  await page.mouse.up();

  await part(page, /^cable, W2/)
    .locator('.hit')
    .first()
    .click();
  await carry(
    page,
    await middle(page.locator('[data-end="drives"]')),
    await under(part(page, /^busbar, Intake/), 0.2),
  );
  await expect(page.locator('output.plan')).toContainText('join Main board and Intake by W2');
  await page.keyboard.press('Escape');
  await page.mouse.up();

  await settled(page);
  expect(await savedStudy(page)).toEqual(before);
  expect(await undoWords(page)).toBe('');
});

test('a part dragged to another busbar hangs there, and undo says so', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const before = await savedStudy(page);
  await carry(
    page,
    await middle(
      part(page, /^bank, Bank C1/)
        .locator('.hit')
        .first(),
    ),
    await under(part(page, /^busbar, Drives board/), 0.5),
  );
  await page.mouse.up();
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'c1')).toMatchObject({ bus: 'drives' });
  expect(await undoWords(page)).toContain('Bank C1');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(before.elements);
  await page.keyboard.press('Control+Shift+z');
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'c1')).toMatchObject({ bus: 'drives' });
});

test('a second transformer with its foot dragged over runs in parallel', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  await carryFromTray(page, 'transformer', await under(part(page, /^busbar, Intake/), 0.85));
  await page.mouse.up();
  await settled(page);
  const added = (await savedStudy(page)).elements.at(-1);
  if (added?.kind !== 'transformer') throw new Error('no transformer was added');
  await carry(
    page,
    await middle(page.locator(`[data-end="${added.to}"]`)),
    await under(part(page, /^busbar, Main board/), 0.8),
  );
  await expect(page.locator('output.plan')).toContainText(/^join Intake and Main board by T/);
  await page.mouse.up();
  await settled(page);
  const last = (await savedStudy(page)).elements.at(-1);
  expect(last).toMatchObject({ kind: 'transformer', from: 'intake', to: 'main' });
});

test('parts change places along their busbar by dragging and by Alt and arrow', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const centre = async (name: RegExp) => (await middle(part(page, name).locator('.hit').first())).x;
  const inOrder = async () => (await centre(/^bank, Bank C1/)) < (await centre(/^motor, Compressors/));
  expect(await inOrder()).toBe(true);
  const load = await middle(
    part(page, /^load, Defrost/)
      .locator('.hit')
      .first(),
  );
  await carry(
    page,
    await middle(
      part(page, /^bank, Bank C1/)
        .locator('.hit')
        .first(),
    ),
    {
      x: load.x - 20,
      y: load.y,
    },
  );
  await page.mouse.up();
  await settled(page);
  await expect.poll(inOrder).toBe(false);
  await page.keyboard.press('Alt+ArrowLeft');
  await expect.poll(inOrder).toBe(true);
  await page.keyboard.press('Control+z');
  await expect.poll(inOrder).toBe(false);
});

test('several parts are chosen, duplicated and deleted together, each step undone in words', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  const before = await savedStudy(page);
  await part(page, /^drive, Fans|^drive or converter, Fans|Fans/).click();
  await part(page, /Pumps/).click({ modifiers: ['Shift'] });
  await page.keyboard.press('Control+d');
  await settled(page);
  expect((await savedStudy(page)).elements).toHaveLength(before.elements.length + 2);
  expect(await undoWords(page)).toMatch(/^duplicate/);
  await page.keyboard.press('Control+z');
  await settled(page);
  await part(page, /Fans/).click();
  await part(page, /Pumps/).click({ modifiers: ['Shift'] });
  await page.keyboard.press('Delete');
  await settled(page);
  expect((await savedStudy(page)).elements.map(({ id }) => id)).not.toContain('fans');
  expect(await undoWords(page)).toMatch(/^(remove|delete)/);
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(before.elements);
});

test('by keyboard alone an empty page becomes a site, and a part moves to another busbar', async ({
  page,
}) => {
  await page.goto('/');
  const drop = async (kind: string, down = 0) => {
    await page.locator(`[data-tray="${kind}"]`).focus();
    await page.keyboard.press('Enter');
    for (let step = 0; step < down; step += 1) await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
  };
  await drop('supply');
  await expect(part(page, /^busbar, Intake/)).toBeVisible();
  await drop('transformer');
  await expect(part(page, /^busbar, 400 V/)).toBeVisible();
  await drop('motor', 1);
  await settled(page);
  const hung = (await savedStudy(page)).elements.at(-1);
  expect(hung).toMatchObject({ kind: 'motor', bus: 'bus2' });
  await page.keyboard.press('h');
  await expect(page.locator('output.plan')).toContainText('stays where it is');
  await page.keyboard.press('ArrowUp');
  await expect(page.locator('output.plan')).toContainText('on Intake');
  await page.keyboard.press('Escape');
  await expect(page.locator('output.plan')).toHaveText('');
  expect((await savedStudy(page)).elements.at(-1)).toEqual(hung);
  await page.keyboard.press('h');
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Enter');
  await settled(page);
  expect((await savedStudy(page)).elements.at(-1)).toMatchObject({ kind: 'motor', bus: 'bus1' });
});

test('a case is made, named, copied and removed, and undo brings it back', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const menu = page.locator('.case-menu .menu-button');
  const choose = async (words: RegExp) => {
    await menu.click();
    await page.getByRole('menuitem', { name: words }).click();
  };
  await choose(/^New case/);
  await expect(page.getByRole('radio', { name: /No changes yet/ })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page.getByRole('textbox', { name: 'name' })).toBeFocused();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('Sunday');
  await page.keyboard.press('Enter');
  await page.getByRole('combobox', { name: 'role' }).selectOption('light load');
  await page.keyboard.press('Escape');
  await expect(menu).toContainText('Sunday');
  await settled(page);
  expect((await savedStudy(page)).cases?.at(-1)).toMatchObject({ name: 'Sunday', role: 'light' });
  await page.keyboard.press('F8');
  await expect(menu).toContainText('Day, all steps');
  await page.keyboard.press('Shift+F8');
  await expect(menu).toContainText('Sunday');
  await choose(/^Remove Sunday/);
  await expect(menu).not.toContainText('Sunday');
  await settled(page);
  expect(await undoWords(page)).toBe('remove case Sunday');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).cases?.map(({ name }) => name)).toContain('Sunday');
});

test('a finding leads to the part it speaks of', async ({ page }) => {
  await page.goto('/');
  await carryFromTray(page, 'bus', { x: 600, y: 300 });
  await page.mouse.up();
  await page.getByRole('button', { name: /found about the data/ }).click();
  const margin = page.getByRole('complementary', { name: 'Margin' });
  await expect(margin.getByRole('button', { name: /nothing feeds the site/i })).toBeVisible();
  await carryFromTray(page, 'supply', await under(part(page, /^busbar/), 0.5));
  await page.mouse.up();
  await carryFromTray(page, 'bus', { x: 600, y: 300 });
  await page.mouse.up();
  await margin.getByRole('button', { name: /Busbar 2/ }).click();
  await expect(page.getByRole('dialog', { name: 'Data of busbar Busbar 2' })).toBeVisible();
});

test('the command list runs its first match on Enter and closes on Escape', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const search = page.getByRole('searchbox', { name: 'Find a command' });
  await page.keyboard.press('Control+k');
  await expect(search).toBeFocused();
  await page.keyboard.type('rms');
  await page.keyboard.press('Enter');
  await expect(search).toBeHidden();
  await expect(page.getByRole('combobox', { name: 'Readings on the drawing' })).toHaveValue('rms');
  await page.keyboard.press('Control+k');
  await expect(search).toBeFocused();
  await page.keyboard.type('sheet');
  await page.keyboard.press('Escape');
  await expect(search).toBeHidden();
});

test('a reload brings back the case, the order, the reading, the theme and what can be undone', async ({
  page,
}) => {
  await openSampleSite(page, 'cold-store');
  await page.keyboard.press('F8');
  await page.getByRole('combobox', { name: 'Readings on the drawing' }).selectOption('order');
  await page.locator('.rail-plot').focus();
  await page.keyboard.press('Home');
  for (let order = 1; order < 7; order += 1) await page.keyboard.press('ArrowRight');
  await expect(rail(page)).toHaveAttribute('aria-valuenow', '7');
  await page.keyboard.press('Control+k');
  await page.keyboard.type('dark');
  await page.keyboard.press('Enter');
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
  await part(page, /^bank, Bank C1/)
    .locator('.hit')
    .first()
    .click();
  await page.keyboard.press('Control+d');
  await settled(page);
  const before = await savedStudy(page);
  await page.reload();
  await settled(page);
  expect(await savedStudy(page)).toEqual(before);
  await expect(page.locator('.case-menu')).toContainText('Morning');
  await expect(rail(page)).toHaveAttribute('aria-valuenow', '7');
  await expect(page.getByRole('combobox', { name: 'Readings on the drawing' })).toHaveValue('order');
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
  expect(await undoWords(page)).toMatch(/^duplicate/);
});

test('the drawing zooms, fits and reads as a list', async ({ page }) => {
  await openSampleSite(page, 'cold-store');
  const percent = page.getByRole('button', { name: 'Fit the whole drawing' });
  const fitted = (await percent.textContent()) ?? '';
  await page.getByRole('button', { name: 'Zoom in' }).click();
  await expect(percent).not.toHaveText(fitted);
  await percent.click();
  await expect(percent).toHaveText(fitted);
  await page.getByRole('button', { name: 'as a list' }).click();
  await expect(page.getByRole('tree')).toContainText('Compressors');
  await page.getByRole('button', { name: 'as a drawing' }).click();
  await expect(part(page, /^motor, Compressors/)).toBeVisible();
});
