import { expect, type Page, test } from '@playwright/test';
import {
  carry,
  carryFromTray,
  middle,
  openSampleSite,
  part,
  saveByDownload,
  savedStudy,
  settled,
  under,
  undoWords,
} from './workbench.ts';

const bank = /^bank, Bank C1/;
const cable = /^cable, W2/;
const compressors = /^motor, Compressors/;
const defrost = /^load, Defrost/;
const intake = /^busbar, Intake/;
const main = /^busbar, Main board/;
const drives = /^busbar, Drives board/;

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
});

const symbol = (page: Page, name: RegExp) => part(page, name).locator('.hit').first();
const at = async (page: Page, name: RegExp) => middle(symbol(page, name));
const plan = (page: Page) => page.locator('output.plan');
const selected = (page: Page) => page.locator('[data-subject][aria-pressed="true"]');

async function isUnchanged(page: Page, before: unknown): Promise<void> {
  await settled(page);
  expect(await savedStudy(page)).toEqual(before);
}

/** What was done is undone and done again, each time the very same study. */
async function undoneAndRedone(page: Page, before: { elements: unknown; buses: unknown }, words: RegExp) {
  const after = await savedStudy(page);
  expect(await undoWords(page)).toMatch(words);
  await page.keyboard.press('Control+z');
  await expect(plan(page)).toContainText(/^Undone: /);
  await settled(page);
  const back = await savedStudy(page);
  expect([back.buses, back.elements]).toEqual([before.buses, before.elements]);
  await page.keyboard.press('Control+Shift+z');
  await settled(page);
  expect(await savedStudy(page)).toEqual(after);
}

const gestures: readonly { name: string; begin(page: Page): Promise<void>; shown: RegExp }[] = [
  {
    name: 'a part from the tray',
    begin: async (page) => carryFromTray(page, 'motor', await under(part(page, main), 0.6)),
    shown: /^hang motor on Main board$/,
  },
  {
    name: 'a part in the hand',
    begin: async (page) => carry(page, await at(page, bank), await under(part(page, drives), 0.4)),
    shown: /^hang Bank C1 on Drives board$/,
  },
  {
    name: 'a branch in the hand',
    begin: async (page) => carry(page, await at(page, cable), await under(part(page, intake), 0.8)),
    shown: /^hang W2 with 3 parts and 1 busbar below on Intake$/,
  },
  {
    name: 'an end in the hand',
    begin: async (page) => {
      await carry(
        page,
        await middle(page.locator('[data-end="drives"] .handle')),
        await under(part(page, intake), 0.2),
      );
    },
    shown: /^join Main board and Intake by W2; Drives board loses its feed$/,
  },
  {
    name: 'a rubber band',
    begin: async (page) => {
      const [from, to] = [await at(page, bank), await at(page, defrost)];
      await page.keyboard.down('Shift');
      await carry(page, { x: from.x - 60, y: from.y - 40 }, { x: to.x + 30, y: to.y + 70 });
      await page.keyboard.up('Shift');
    },
    shown: /^3 parts$/,
  },
];

const waysOut: readonly { name: string; leave(page: Page): Promise<void> }[] = [
  { name: 'Escape', leave: (page) => page.keyboard.press('Escape') },
  {
    name: 'the right button',
    leave: async (page) => {
      await page.mouse.down({ button: 'right' });
      await page.mouse.up({ button: 'right' });
    },
  },
  {
    name: 'the loss of the window',
    leave: (page) => page.evaluate(() => void window.dispatchEvent(new Event('blur'))),
  },
  {
    name: 'a cancelled pointer',
    leave: (page) =>
      page.evaluate(() => {
        const pane = document.querySelector('[data-drawing-pane]');
        pane?.dispatchEvent(new PointerEvent('pointercancel', { bubbles: true, pointerId: 1 }));
      }),
  },
];

for (const { name, begin, shown } of gestures) {
  test(`${name} is given up by Escape, the right button, the loss of the window and a cancelled pointer, without a trace`, async ({
    page,
  }) => {
    await symbol(page, cable).click();
    const before = await savedStudy(page);
    for (const way of waysOut) {
      await begin(page);
      await expect(plan(page), way.name).toHaveText(shown);
      await way.leave(page);
      await expect(plan(page), way.name).toHaveText('');
      await expect(page.locator('.hand, .hand-tag, .band, .bus.target, .held')).toHaveCount(0);
      await page.mouse.up();
      await expect(selected(page)).toHaveCount(1);
      await expect(part(page, cable)).toHaveAttribute('aria-pressed', 'true');
      await expect(page.locator('[data-tray][aria-pressed="true"]')).toHaveCount(0);
    }
    await isUnchanged(page, before);
    expect(await undoWords(page)).toBe('');
  });
}

test('a drop says what will happen, lights the busbar, marks the place, and is undone in words', async ({
  page,
}) => {
  const before = await savedStudy(page);
  const [left, right] = [await at(page, compressors), await at(page, defrost)];
  await carryFromTray(page, 'motor', { x: (left.x + right.x) / 2, y: left.y });
  await expect(page.locator('.hand-tag')).toHaveText('hang motor on Main board');
  await expect(page.locator('.bus.target')).toHaveAttribute('data-subject', 'bus:main');
  const mark = await middle(page.locator('.hand .mark'));
  expect(mark.x).toBeGreaterThan(left.x);
  expect(mark.x).toBeLessThan(right.x);
  await page.mouse.up();
  await settled(page);
  expect((await savedStudy(page)).elements.at(-1)).toMatchObject({ kind: 'motor', bus: 'main' });
  await expect.poll(async () => (await at(page, /^motor, Motor 1/)).x).toBeGreaterThan(left.x);
  await undoneAndRedone(page, before, /^add Motor 1 at Main board$/);
});

test('a branch moves with all that hangs below it, and not below itself', async ({ page }) => {
  const before = await savedStudy(page);
  await carry(page, await at(page, cable), await under(part(page, drives), 0.8));
  await expect(page.locator('.hand-tag.refused')).toHaveText(/not possible: both ends of W2/);
  await page.mouse.up();
  await isUnchanged(page, before);
  await carry(page, await at(page, cable), await under(part(page, intake), 0.9));
  await page.mouse.up();
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'w2')).toMatchObject({
    from: 'intake',
    to: 'drives',
  });
  await undoneAndRedone(page, before, /^move cable W2 with 3 parts and 1 busbar below to Intake$/);
});

test('either end of a series part goes to another busbar by mouse and by keyboard', async ({ page }) => {
  const before = await savedStudy(page);
  await symbol(page, cable).click();
  await carry(
    page,
    await middle(page.locator('[data-end="main"] .handle')),
    await under(part(page, intake), 0.9),
  );
  await expect(page.locator('.hand-tag')).toHaveText('join Drives board and Intake by W2');
  await page.mouse.up();
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'w2')).toMatchObject({ from: 'intake' });
  await page.keyboard.press('Control+z');
  await settled(page);
  await page.keyboard.press('Shift+J');
  await page.keyboard.press('ArrowUp');
  await expect(plan(page)).toHaveText('join Drives board and Intake by W2');
  await page.keyboard.press('Escape');
  await expect(part(page, cable)).toBeFocused();
  await page.keyboard.press('j');
  await page.keyboard.press('ArrowUp');
  await expect(plan(page)).toHaveText(/not possible: both ends/);
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Enter');
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ id }) => id === 'w2')).toMatchObject({
    from: 'main',
    to: 'intake',
  });
  await undoneAndRedone(page, before, /^move the lower end of cable W2 to Intake$/);
});

test('a part dropped onto another replaces it, keeping name, place and what means the same', async ({
  page,
}) => {
  const before = await savedStudy(page);
  await carryFromTray(page, 'filter', await at(page, bank));
  await expect(page.locator('.hand-tag')).toHaveText('replace Bank C1 by filter, keeping name and place');
  await expect(page.locator('.hand .taken')).toBeVisible();
  await page.mouse.up();
  await settled(page);
  const after = await savedStudy(page);
  expect(after.elements.map(({ id }) => id)).toEqual(before.elements.map(({ id }) => id));
  expect(after.elements.find(({ id }) => id === 'c1')).toMatchObject({
    kind: 'filter',
    name: 'Bank C1',
    bus: 'main',
  });
  expect(after.view?.pins).toEqual(before.view?.pins);
  await undoneAndRedone(page, before, /^replace Bank C1 by filter$/);
  // Onto its own kind it hangs beside; a kind with another number of ends hangs from the busbar as well.
  await carryFromTray(page, 'load', await at(page, defrost));
  await expect(page.locator('.hand-tag')).toHaveText('hang load on Main board');
  await page.keyboard.press('Escape');
  await page.mouse.up();
});

test('by keyboard a part is swapped for another kind by its letter or by arrows, and Escape leaves it', async ({
  page,
}) => {
  const before = await savedStudy(page);
  await symbol(page, compressors).click();
  await page.keyboard.press('w');
  await expect(plan(page)).toHaveText('replace motor Compressors by drive, keeping name and place');
  await page.keyboard.press('ArrowRight');
  await expect(plan(page)).toHaveText(/by load,/);
  await page.keyboard.press('Escape');
  await expect(plan(page)).toHaveText('');
  await isUnchanged(page, before);
  await page.keyboard.press('w');
  await page.keyboard.press('d');
  await settled(page);
  expect((await savedStudy(page)).elements.find(({ name }) => name === 'Compressors')).toMatchObject({
    kind: 'converter',
    bus: 'main',
  });
  await undoneAndRedone(page, before, /^replace motor Compressors by drive$/);
});

test('a part moves along its busbar to the insertion mark', async ({ page }) => {
  const before = await savedStudy(page);
  const target = await at(page, defrost);
  await carry(page, await at(page, bank), { x: target.x - 25, y: target.y });
  await expect(page.locator('.hand-tag')).toHaveText('move Bank C1 along Main board');
  const mark = await middle(page.locator('.hand .mark'));
  expect(mark.x).toBeLessThan(target.x);
  expect(mark.x).toBeGreaterThan((await at(page, compressors)).x);
  await page.mouse.up();
  await settled(page);
  await undoneAndRedone(page, before, /^move Bank C1 along Main board$/);
  // Put back where it was it stays.
  const here = await at(page, bank);
  await carry(page, here, { x: here.x + 6, y: here.y + 6 });
  await expect(page.locator('.hand-tag')).toHaveText('Bank C1 stays where it is');
  await page.mouse.up();
});

test('several parts are chosen by band, click and keys, and move together as one step', async ({ page }) => {
  const before = await savedStudy(page);
  const [from, to] = [await at(page, bank), await at(page, compressors)];
  await page.keyboard.down('Shift');
  await carry(page, { x: from.x - 50, y: from.y - 40 }, { x: to.x + 30, y: to.y + 40 });
  await page.mouse.up();
  await page.keyboard.up('Shift');
  await expect(selected(page)).toHaveCount(2);
  await symbol(page, defrost).click({ modifiers: ['Control'] });
  await expect(selected(page)).toHaveCount(3);
  await symbol(page, defrost).click({ modifiers: ['Shift'] });
  await expect(selected(page)).toHaveCount(2);
  await carry(page, await at(page, compressors), await under(part(page, drives), 0.5));
  await expect(page.locator('.hand-tag')).toHaveText('hang 2 parts on Drives board');
  await page.mouse.up();
  await settled(page);
  const moved = (await savedStudy(page)).elements.filter((one) => 'bus' in one && one.bus === 'drives');
  expect(moved).toHaveLength(5);
  await undoneAndRedone(page, before, /^move 2 parts to Drives board$/);

  await symbol(page, /^drive, Fans/).click();
  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('Shift+ArrowRight');
  await expect(selected(page)).toHaveCount(3);
  await page.keyboard.press('Shift+ArrowLeft');
  await expect(selected(page)).toHaveCount(2);
  await page.keyboard.press('Control+a');
  await expect(selected(page)).toHaveCount(before.elements.length + before.buses.length);
  await page.keyboard.press('Escape');
  await expect(selected(page)).toHaveCount(0);
});

test('parts go through the clipboard to another window and another study, with what hangs below', async ({
  page,
  browser,
}) => {
  const context = await browser.newContext({ baseURL: new URL(page.url()).origin });
  const other = await context.newPage();
  await saveByDownload(other);
  await openSampleSite(other, 'office-tower');
  const there = await savedStudy(other);

  await page.bringToFront();
  const here = await savedStudy(page);
  await symbol(page, cable).click();
  await page.keyboard.press('Control+c');
  await expect(plan(page)).toHaveText(/^Copied 4 parts and 1 busbar/);

  await other.bringToFront();
  const board = other
    .getByRole('region', { name: 'Drawing' })
    .getByRole('button', { name: /^busbar,/ })
    .first();
  await board.locator('.hit').first().click();
  await other.keyboard.press('Control+v');
  await expect(plan(other)).toHaveText(/^Pasted 4 parts and 1 busbar/);
  await settled(other);
  const after = await savedStudy(other);
  expect(after.elements).toHaveLength(there.elements.length + 4);
  expect(after.buses).toHaveLength(there.buses.length + 1);
  expect(new Set(after.elements.map(({ id }) => id)).size).toBe(after.elements.length);
  await undoneAndRedone(other, there, /^paste 4 parts and 1 busbar/);

  await context.close();

  expect(await savedStudy(page)).toEqual(here);
  await symbol(page, bank).click();
  await page.keyboard.press('Control+x');
  await expect(plan(page)).toHaveText(/^Cut 1 part/);
  await settled(page);
  expect((await savedStudy(page)).elements.map(({ id }) => id)).not.toContain('c1');
  await part(page, drives).locator('.hit').first().click();
  await page.keyboard.press('Control+v');
  await settled(page);
  expect((await savedStudy(page)).elements.at(-1)).toMatchObject({
    kind: 'bank',
    name: 'Bank C1',
    bus: 'drives',
  });
  expect(await undoWords(page)).toBe('paste Bank C1 at Drives board');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect(await undoWords(page)).toBe('cut Bank C1');
  await page.keyboard.press('Control+z');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(here.elements);
});

test('a clipboard without sound parts is refused in words and changes nothing', async ({ page }) => {
  const before = await savedStudy(page);
  const refused: readonly [text: string, words: RegExp][] = [
    ['see you at noon', /holds no parts/],
    ['kW\tcos φ\n55\t0.85', /holds a table/],
    ['{"format":"varwright-parts","version":1,"study":{"elements":[', /cut off or damaged/],
    [
      '{"format":"varwright-parts","version":1,"hangsFrom":[],"study":{"format":"varwright-study","version":1,"title":"x","frequencyHz":50,"buses":[],"elements":[{"id":"m","kind":"motor","bus":"b","ratedKW":-4}]}}',
      /cannot be pasted: .*ratedKW|rated shaft power/,
    ],
  ];
  await symbol(page, bank).click();
  for (const [text, words] of refused) {
    await page.evaluate((pasted) => {
      const data = new DataTransfer();
      data.setData('text/plain', pasted);
      document.activeElement?.dispatchEvent(
        new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
      );
    }, text);
    await expect(plan(page)).toHaveText(words);
    await expect(plan(page)).toContainText('Nothing has changed');
  }
  await isUnchanged(page, before);
  expect(await undoWords(page)).toBe('');
});

test('what hangs below is asked for once, with the count, and comes back by undo', async ({ page }) => {
  const before = await savedStudy(page);
  await symbol(page, cable).click();
  await page.keyboard.press('Delete');
  const question = page.getByRole('alertdialog');
  await expect(question).toContainText('Remove cable W2 with 3 parts and 1 busbar below?');
  await page.keyboard.press('Escape');
  await expect(question).toHaveCount(0);
  await expect(part(page, cable)).toBeFocused();
  await isUnchanged(page, before);
  await page.keyboard.press('Delete');
  await question.getByRole('button', { name: 'Remove' }).press('Enter');
  await settled(page);
  expect((await savedStudy(page)).elements).toHaveLength(before.elements.length - 4);
  await expect(part(page, main)).toBeFocused();
  await undoneAndRedone(page, before, /^remove cable W2 with 3 parts and 1 busbar below$/);
  // A part with nothing below goes without a question.
  await symbol(page, bank).click();
  await page.keyboard.press('Delete');
  await expect(question).toHaveCount(0);
  await expect(part(page, bank)).toHaveCount(0);
});

test('copies stand beside their originals', async ({ page }) => {
  const before = await savedStudy(page);
  await symbol(page, compressors).click();
  await page.keyboard.press('Control+d');
  await settled(page);
  const copy = /^motor, Compressors 2/;
  await expect.poll(async () => (await at(page, copy)).x < (await at(page, defrost)).x).toBe(true);
  await expect(part(page, copy)).toBeFocused();
  await undoneAndRedone(page, before, /^duplicate motor Compressors$/);
});

test('a letter adds a part beside the one in focus and opens its data; undo leaves the focus on the drawing', async ({
  page,
}) => {
  const before = await savedStudy(page);
  await symbol(page, compressors).click();
  await page.keyboard.press('d');
  await expect(page.getByRole('dialog', { name: 'Data of Drive 1' })).toBeVisible();
  await page.keyboard.type('45');
  await page.keyboard.press('Control+Enter');
  await settled(page);
  const added = (await savedStudy(page)).elements.at(-1);
  expect(added).toMatchObject({ kind: 'converter', bus: 'main', kW: 45 });
  await expect(part(page, /^drive, Drive 1/)).toBeFocused();
  await page.keyboard.press('Control+z');
  await page.keyboard.press('Control+z');
  await expect(part(page, main)).toBeFocused();
  await isUnchanged(page, before);
});

test('a new series part hangs with a busbar of its own, or between two that stand', async ({ page }) => {
  await part(page, main).locator('.hit').first().click();
  await page.keyboard.press('c');
  await page.keyboard.press('Control+Enter');
  await settled(page);
  const first = await savedStudy(page);
  expect(first.elements.at(-1)).toMatchObject({ kind: 'cable', from: 'main', to: first.buses.at(-1)?.id });

  await part(page, main).locator('.hit').first().click();
  await page.keyboard.press('Shift+O');
  await expect(plan(page)).toHaveText(/not possible: both ends of the coupler/);
  await page.keyboard.press('ArrowDown');
  await expect(plan(page)).toHaveText(/^join Main board and .* by coupler$/);
  await page.keyboard.press('Enter');
  await page.keyboard.press('Escape');
  await settled(page);
  const second = await savedStudy(page);
  expect(second.buses).toHaveLength(first.buses.length);
  expect(second.elements.at(-1)).toMatchObject({ kind: 'coupler', from: 'main' });

  await page.locator('[data-tray="cable"]').focus();
  await page.keyboard.press('Enter');
  await page.keyboard.press('ArrowUp');
  await expect(plan(page)).toHaveText(/^hang cable on Intake, with a new busbar/);
  await page.keyboard.press('Shift+Enter');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await settled(page);
  expect((await savedStudy(page)).elements.at(-1)).toMatchObject({
    kind: 'cable',
    from: 'intake',
    to: 'main',
  });
});

test('what is out of sight comes into sight while a part is held at the edge', async ({ page }) => {
  for (let presses = 0; presses < 4; presses += 1)
    await page.getByRole('button', { name: 'Zoom in' }).click();
  const pane = await page.locator('[data-drawing-pane]').boundingBox();
  if (!pane) throw new Error('no drawing');
  const start = await at(page, compressors);
  const before = start.y;
  await carry(page, start, { x: start.x, y: pane.y + pane.height / 2 });
  await page.mouse.move(start.x, pane.y + pane.height - 6, { steps: 4 });
  await expect.poll(async () => (await at(page, compressors)).y).toBeLessThan(before - 100);
  await page.keyboard.press('Escape');
  await page.mouse.up();
});
