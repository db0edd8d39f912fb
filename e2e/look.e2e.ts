import { expect, type Page, test } from '@playwright/test';
import { note, openSampleSite, rail } from './workbench.ts';

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
