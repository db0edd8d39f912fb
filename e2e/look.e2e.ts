import { readFileSync } from 'node:fs';
import { expect, type Page, test } from '@playwright/test';
import {
  middle,
  note,
  openSampleSite,
  part,
  pdfPages,
  rail,
  saveByDownload,
  savedStudy,
  undoWords,
} from './workbench.ts';

const notesEdge = (page: Page) => page.getByRole('separator', { name: 'Width of the notes' });
const railEdge = (page: Page) => page.getByRole('separator', { name: 'Height of the rail' });
const notesWidth = async (page: Page) => (await page.locator('#notes-panel').boundingBox())?.width ?? 0;

test.describe('panels', () => {
  test.beforeEach(({ page }) => openSampleSite(page, 'cold-store'));

  test('the edge of the notes is dragged, and gives the drag up on Escape', async ({ page }) => {
    const before = await notesWidth(page);
    const edge = await notesEdge(page).boundingBox();
    if (!edge) throw new Error('no edge');
    const at = { x: edge.x + 6, y: edge.y + 200 };
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    await page.mouse.move(at.x - 90, at.y, { steps: 5 });
    expect(await notesWidth(page)).toBeCloseTo(before + 90, 0);
    await page.keyboard.press('Escape');
    expect(await notesWidth(page)).toBeCloseTo(before, 0);
    await page.mouse.up();
    await page.mouse.move(at.x, at.y);
    await page.mouse.down();
    await page.mouse.move(at.x - 60, at.y, { steps: 5 });
    await page.mouse.up();
    expect(await notesWidth(page)).toBeCloseTo(before + 60, 0);
    await page.reload();
    await expect(note(page, 'Intake · current from Supply')).toBeVisible();
    expect(await notesWidth(page), 'remembered').toBeCloseTo(before + 60, 0);
    await notesEdge(page).dblclick();
    expect(await notesWidth(page), 'a double click gives the usual width').toBeCloseTo(before, 0);
  });

  test('every edge is moved and folded by keys', async ({ page }) => {
    const before = await notesWidth(page);
    await notesEdge(page).focus();
    await page.keyboard.press('ArrowLeft');
    expect(await notesWidth(page)).toBe(before + 16);
    await page.keyboard.press('Enter');
    await expect(page.getByRole('button', { name: 'Open the notes' })).toBeVisible();
    await expect(notesEdge(page)).toHaveAttribute('aria-valuetext', 'folded');
    await page.keyboard.press('ArrowLeft');
    await expect(note(page, 'Intake · current from Supply')).toBeVisible();

    const height = async () => (await rail(page).boundingBox())?.height ?? 0;
    const high = await height();
    await railEdge(page).focus();
    await page.keyboard.press('Shift+ArrowUp');
    expect(await height()).toBe(high + 80);
    await page.keyboard.press('Enter');
    await expect(page.locator('.rail-plot')).toBeHidden();
    await rail(page).press('ArrowRight');
    await expect(rail(page), 'the strip is the slider then').toContainText('h 2.000');
    await page.getByRole('button', { name: 'Open the rail' }).click();
    await expect(page.locator('.rail-plot')).toBeVisible();
  });

  test('folded notes leave their letters, and a letter opens its note', async ({ page }) => {
    await page.keyboard.press('F9');
    const letters = page.getByRole('region', { name: 'Notes' });
    await letters.getByRole('button', { name: 'Open the note: Bank C1 · current' }).click();
    const title = note(page, 'Bank C1 · current').getByRole('button', { name: 'Bank C1 · current' });
    await expect(title).toBeFocused();
    await expect(title).toHaveAttribute('aria-expanded', 'true');
  });

  test('the tray shows symbols alone and keeps their names', async ({ page }) => {
    await page.getByRole('button', { name: 'Tray: symbols alone' }).click();
    const bank = page.getByRole('toolbar', { name: 'Tray of parts' }).getByRole('button', { name: 'bank' });
    expect((await bank.boundingBox())?.width).toBeLessThan(50);
    await page.reload();
    await expect(page.getByRole('button', { name: 'Tray: words under the symbols' })).toBeVisible();
  });
});

for (const size of [
  { width: 1024, height: 768 },
  { width: 1440, height: 900 },
  { width: 2560, height: 1440 },
  { width: 720, height: 450 },
]) {
  test(`nothing is cut off in a window of ${size.width} × ${size.height}`, async ({ page }) => {
    await page.setViewportSize(size);
    await page.goto('/?sample=cold-store');
    await expect(page.locator('.drawing .part').first()).toBeVisible();
    const cut = await page.evaluate(() => {
      const shown = (element: Element) => element.checkVisibility({ visibilityProperty: true });
      const controls = [...document.querySelectorAll('button, select, [role="slider"], .rail-bus')].filter(
        shown,
      );
      return controls.flatMap((control) => {
        const box = control.getBoundingClientRect();
        if (control.closest('.notes-list, .notes-letters ul')) return [];
        const inside =
          box.left >= -1 && box.top >= -1 && box.right <= innerWidth + 1 && box.bottom <= innerHeight + 1;
        return inside
          ? []
          : [`${control.getAttribute('aria-label') ?? control.textContent} ${JSON.stringify(box)}`];
      });
    });
    expect(cut).toEqual([]);
    const tray = page.locator('.tray');
    expect(await tray.evaluate((list) => list.scrollHeight - list.clientHeight)).toBeLessThanOrEqual(1);
  });
}

test.describe('the rail', () => {
  test.use({ hasTouch: true });
  test.beforeEach(({ page }) => openSampleSite(page, 'cold-store'));

  const order = async (page: Page) => Number(await rail(page).getAttribute('aria-valuenow'));

  test('an order or a frequency can be typed, P finds the peak, Escape the fundamental', async ({ page }) => {
    await page.getByRole('button', { name: 'order or Hz…' }).click();
    const entry = page.getByRole('textbox', { name: 'order or Hz' });
    await entry.fill('350 Hz');
    await entry.press('Enter');
    expect(await order(page)).toBe(7);
    await expect(rail(page)).toBeFocused();
    await page.keyboard.type('11,5');
    await page.keyboard.press('Enter');
    expect(await order(page)).toBe(11.5);
    await page.keyboard.type('900');
    await page.keyboard.type('0');
    await page.keyboard.press('Enter');
    await expect(page.getByRole('alert')).toContainText('Allowed are orders');
    await page.keyboard.press('Escape');
    await rail(page).press('Home');
    await rail(page).press('p');
    const words = (await page.locator('.rail-flag text').first().textContent()) ?? '';
    expect(words).toContain(`h ${(await order(page)).toFixed(2)}`);
    await rail(page).press('Escape');
    expect(await order(page)).toBe(1);
  });

  test('Escape ends a drag where it began', async ({ page }) => {
    await page.keyboard.press('Escape');
    const box = await rail(page).boundingBox();
    if (!box) throw new Error('no rail');
    const before = await order(page);
    await page.mouse.move(box.x + 400, box.y + 60);
    await page.mouse.down();
    await page.mouse.move(box.x + 800, box.y + 60, { steps: 6 });
    await expect.poll(() => order(page)).toBeGreaterThan(4);
    await page.keyboard.press('Escape');
    expect(await order(page)).toBe(before);
    await page.mouse.move(box.x + 900, box.y + 60);
    await page.mouse.up();
    expect(await order(page)).toBe(before);
  });

  test('Ctrl and wheel widens the axis and a plain wheel leaves it; two fingers pinch it', async ({
    page,
  }) => {
    const whole = page.getByRole('button', { name: 'whole axis' });
    const box = await rail(page).boundingBox();
    if (!box) throw new Error('no rail');
    const [x, y] = [box.x + 700, box.y + 60];
    await page.mouse.move(x, y);
    await page.mouse.wheel(0, -200);
    await expect(whole).toBeDisabled();
    await page.keyboard.down('Control');
    await page.mouse.wheel(0, -200);
    await page.keyboard.up('Control');
    await expect(whole).toBeEnabled();
    await whole.click();
    await expect(whole).toBeDisabled();

    const ticks = () => page.locator('.rail-plot svg > g').first().locator('text').allTextContents();
    const before = await ticks();
    const touch = await page.context().newCDPSession(page);
    const fingers = (type: 'touchStart' | 'touchMove' | 'touchEnd', ...xs: number[]) =>
      touch.send('Input.dispatchTouchEvent', { type, touchPoints: xs.map((at, id) => ({ x: at, y, id })) });
    await fingers('touchStart', x - 40);
    await fingers('touchStart', x - 40, x + 40);
    for (const apart of [60, 90, 130]) await fingers('touchMove', x - apart, x + apart);
    await expect(whole).toBeEnabled();
    const pinched = await ticks();
    expect(pinched).not.toEqual(before);
    await fingers('touchMove', x - 130);
    await fingers('touchMove', x - 132);
    expect(await ticks(), 'the finger that stays does not zoom').toHaveLength(pinched.length);
    await fingers('touchEnd');
  });
});

test.describe('marks on the drawing', () => {
  test.beforeEach(async ({ page }) => {
    await saveByDownload(page);
    await openSampleSite(page, 'cold-store');
  });

  const marks = async (page: Page) => (await savedStudy(page)).view?.marks ?? [];
  const paperAt = async (page: Page, x: number, y: number) => {
    const box = await page.locator('.drawing .pane').boundingBox();
    if (!box) throw new Error('no paper');
    return { x: box.x + x, y: box.y + y };
  };
  const drawBetween = async (page: Page, from: { x: number; y: number }, to: { x: number; y: number }) => {
    await page.mouse.move(from.x, from.y);
    await page.mouse.down();
    await page.mouse.move(to.x, to.y, { steps: 5 });
  };

  test('a note is written, dragged, reworded and removed by mouse, each undone in words', async ({
    page,
  }) => {
    await page.getByRole('button', { name: 'Write on the drawing' }).click();
    const at = await paperAt(page, 650, 120);
    await page.mouse.click(at.x, at.y);
    await page.keyboard.type('confirm <b>uk</b>');
    await page.keyboard.press('Enter');
    const words = page.getByRole('button', { name: /^note( at .*)?: confirm <b>uk<\/b>$/ });
    await expect(words).toBeFocused();
    expect(await undoWords(page)).toBe('write the note “confirm <b>uk</b>”');

    const before = await middle(words);
    await drawBetween(page, before, { x: before.x + 60, y: before.y + 40 });
    await page.keyboard.press('Escape');
    await page.mouse.up();
    expect(await middle(words), 'given up').toEqual(before);
    await drawBetween(page, before, { x: before.x + 60, y: before.y + 40 });
    await page.mouse.up();
    expect((await middle(words)).x).toBeCloseTo(before.x + 60, 0);
    expect(await undoWords(page)).toBe('move the note “confirm <b>uk</b>”');

    await words.press('Enter');
    await page.getByRole('textbox', { name: 'Words on the drawing' }).fill('confirmed');
    await page.keyboard.press('Escape');
    await expect(words).toBeVisible();
    await words.dblclick();
    await page.getByRole('textbox', { name: 'Words on the drawing' }).fill('confirmed');
    await page.keyboard.press('Enter');
    const reworded = page.getByRole('button', { name: /^note( at .*)?: confirmed$/ });
    await reworded.press('Delete');
    await expect(reworded).toBeHidden();
    expect(await undoWords(page)).toBe('remove the note “confirmed”');
    for (let step = 0; step < 4; step++) await page.keyboard.press('Control+z');
    expect(await marks(page)).toEqual([]);
    for (let step = 0; step < 2; step++) await page.keyboard.press('Control+Shift+z');
    expect(await marks(page)).toMatchObject([{ kind: 'note', text: 'confirm <b>uk</b>' }]);
  });

  test('cloud, box and arrow are drawn and given up by mouse, and follow their parts', async ({ page }) => {
    const bank = await middle(part(page, /^bank, Bank C1/));
    await page.getByRole('button', { name: 'Cloud round an area' }).click();
    await drawBetween(page, { x: bank.x - 60, y: bank.y - 60 }, { x: bank.x + 60, y: bank.y + 70 });
    await page.keyboard.press('Escape');
    await page.mouse.up();
    expect(await marks(page), 'given up').toEqual([]);

    await page.getByRole('button', { name: 'Cloud round an area' }).click();
    await drawBetween(page, { x: bank.x - 60, y: bank.y - 60 }, { x: bank.x + 60, y: bank.y + 70 });
    await page.mouse.up();
    await page.keyboard.press('Enter');
    const cloud = page.getByRole('button', { name: /^cloud at Bank C1$/ });
    await expect(cloud).toBeFocused();
    const before = await middle(cloud);
    const part1 = await middle(part(page, /^bank, Bank C1/).locator('.frame'));
    await part(page, /^bank, Bank C1/)
      .locator('.hit')
      .first()
      .click();
    await page.keyboard.press('Alt+ArrowRight');
    await expect
      .poll(async () => (await middle(part(page, /^bank, Bank C1/).locator('.frame'))).x)
      .not.toBe(part1.x);
    const part2 = await middle(part(page, /^bank, Bank C1/).locator('.frame'));
    const after = await middle(cloud);
    expect(after.x - before.x).toBeCloseTo(part2.x - part1.x, 0);
  });

  test('every kind is placed, stretched and removed by keys alone', async ({ page }) => {
    await part(page, /^busbar, Main board/).focus();
    for (const [tool, kind] of [
      ['box round an area', 'box'],
      ['arrow', 'arrow'],
      ['write on the drawing', 'note'],
    ]) {
      await page.keyboard.press('Control+k');
      await page.getByRole('searchbox', { name: 'Find a command' }).fill(`mark: ${tool}`);
      await page.keyboard.press('Enter');
      await expect(page.getByRole('application', { name: /Escape gives it up/ })).toBeFocused();
      await page.keyboard.press('Shift+ArrowRight');
      await page.keyboard.press('Enter');
      if (kind !== 'note') {
        await page.keyboard.press('ArrowDown');
        await page.keyboard.press('Enter');
      }
      await expect(page.getByRole('textbox', { name: 'Words on the drawing' })).toBeFocused();
      await page.keyboard.type(`by keys ${kind}`);
      await page.keyboard.press('Enter');
      await expect(
        page.getByRole('button', { name: new RegExp(`^${kind}.*: by keys ${kind}$`) }),
      ).toBeFocused();
    }
    const [box] = await marks(page);
    await page.getByRole('button', { name: /^box/ }).press('Alt+ArrowRight');
    const [wider] = await marks(page);
    expect(wider?.to?.x).toBe((box?.to?.x ?? 0) + 4);
    expect(wider?.from).toEqual(box?.from);
    await page.getByRole('button', { name: /^arrow/ }).press('Delete');
    expect((await marks(page)).map(({ kind }) => kind)).toEqual(['box', 'note']);
  });

  test('stand on the results sheet', async ({ page }) => {
    await page.getByRole('button', { name: 'Write on the drawing' }).click();
    const at = await paperAt(page, 640, 110);
    await page.mouse.click(at.x, at.y);
    await page.keyboard.type('reviewed 12 May');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Sheet', exact: true }).click();
    const exporting = page.getByRole('button', { name: 'Export PDF' });
    await expect(exporting).toBeEnabled({ timeout: 30_000 });
    const [pdf] = await Promise.all([page.waitForEvent('download', { timeout: 60_000 }), exporting.click()]);
    expect(pdfPages(await pdf.path()).join('\n')).toContain('reviewed 12 May');
  });
});

test.describe('what is handed on', () => {
  test.beforeEach(async ({ page, context }) => {
    await context.grantPermissions(['clipboard-read', 'clipboard-write']);
    await openSampleSite(page, 'cold-store');
  });

  const copied = (page: Page) => page.evaluate(() => navigator.clipboard.readText());

  /** The SVG parses, names its fonts, has no reference to the page, and shows something. */
  const standsAlone = (text: string) => {
    expect(text).toMatch(/^<svg [^>]*xmlns="http:\/\/www\.w3\.org\/2000\/svg"/);
    expect(text).toContain("font-family=\"'Varwright Sans'");
    expect(text).not.toMatch(/var\(|class=|href=/);
    expect(text).toMatch(/<(path|line|rect) /);
  };

  test("every plot as SVG and PNG, and its numbers as a table, by the note's menu", async ({ page }) => {
    const choose = async (picture: string, way: string) => {
      await note(page, 'Intake · current from Supply')
        .getByRole('button', { name: 'What can be done with this note' })
        .click();
      await page.getByRole('menuitem', { name: picture, exact: true }).click();
      await page.getByRole('menuitem', { name: way }).click();
      await expect(page.locator('.plan')).toContainText(`${picture.toLowerCase()}`);
    };
    for (const picture of ['Phasors', 'Waveform', 'Spectrum']) {
      await choose(picture, 'Copy as SVG');
      standsAlone(await copied(page));
      await choose(picture, 'Copy the values as a table');
      expect((await copied(page)).split('\n').length).toBeGreaterThan(3);
      await choose(picture, 'Copy as PNG');
      await expect(page.locator('.plan')).toContainText('Copied as PNG');
      const size = await page.evaluate(async () => {
        const [item] = await navigator.clipboard.read();
        const blob = await item?.getType('image/png');
        const image = blob && (await createImageBitmap(blob));
        return image ? [image.width, image.height] : null;
      });
      expect(size?.[0]).toBeGreaterThan(600);
    }
  });

  test('rail and drawing by their buttons and by the command list', async ({ page }) => {
    await page.getByRole('button', { name: 'picture of the rail' }).click();
    await page.getByRole('menuitem', { name: 'Copy as SVG' }).click();
    await expect(page.locator('.plan')).toContainText('Copied as SVG: Impedance seen at Main board');
    const rail1 = await copied(page);
    standsAlone(rail1);
    expect(rail1).toContain('parallel h');

    await page.getByRole('button', { name: 'picture of the drawing' }).click();
    const [file] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('menuitem', { name: 'Save as SVG…' }).click(),
    ]);
    expect(file.suggestedFilename()).toBe('Brackwater-cold-store-as-found-single-line-diagram.svg');
    const drawn = readFileSync(await file.path(), 'utf8');
    standsAlone(drawn);
    expect(drawn).toContain('Compressors');

    const run = async (words: string) => {
      await page.keyboard.press('Control+k');
      await page.getByRole('searchbox', { name: 'Find a command' }).fill(words);
      await page.keyboard.press('Enter');
    };
    await run('copy the verdicts');
    await expect(page.locator('.plan')).toContainText('Copied: the verdicts of this case');
    const [head, ...rows] = (await copied(page)).split('\n').map((line) => line.split('\t'));
    expect(head?.slice(0, 3)).toEqual(['verdict', 'at', 'check']);
    for (const row of rows) expect(row).toHaveLength(head?.length ?? 0);
    await run('copy the spectrum of main board, voltage as svg');
    await expect(page.locator('.plan')).toContainText('Main board · voltage, spectrum');
    standsAlone(await copied(page));
  });

  test('a note as text by Ctrl+C on its title', async ({ page }) => {
    await note(page, 'Main board · voltage').getByRole('button', { name: 'Main board · voltage' }).focus();
    await page.keyboard.press('Control+c');
    expect(await copied(page)).toMatch(/Main board · voltage\nU\t[\d.]+/);
  });
});
