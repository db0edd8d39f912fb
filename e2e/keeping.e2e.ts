import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import AxeBuilder from '@axe-core/playwright';
import { type Browser, chromium, expect, type Page, test } from '@playwright/test';
import { sampleText } from './engineSays.ts';
import { openSampleSite, part, saveByDownload, savedStudy, settled, undoWords } from './workbench.ts';

const notices = (page: Page) => page.locator('.notice-lines');
const drawer = (page: Page, name: RegExp) => page.getByRole('region', { name });

async function command(page: Page, words: string): Promise<void> {
  await page.keyboard.press('Control+k');
  await expect(page.getByRole('searchbox', { name: 'Find a command' })).toBeFocused();
  await page.keyboard.type(words);
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
}

async function remove(page: Page, id: string): Promise<void> {
  await page.locator(`[data-subject="element:${id}"] .hit`).first().click();
  await page.keyboard.press('Delete');
  await expect(page.locator(`[data-subject="element:${id}"]`)).toHaveCount(0);
}

async function accessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
    .analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual(
    [],
  );
}

test.describe('a page that ends without warning', () => {
  test('its renderer crashes 250 ms after an edit: all is there again, the undo included', async ({
    browser,
  }) => {
    const context = await browser.newContext();
    const page = await context.newPage();
    await openSampleSite(page, 'cold-store');
    await remove(page, 'hoist');
    await remove(page, 'pumps');
    await page.waitForTimeout(250);
    const session = await context.newCDPSession(page);
    const crashed = page.waitForEvent('crash');
    session.send('Page.crash').catch(() => undefined);
    await crashed;

    const again = await context.newPage();
    await saveByDownload(again);
    await again.goto('/');
    await settled(again);
    const ids = (await savedStudy(again)).elements.map(({ id }) => id);
    expect(ids).toHaveLength(7);
    expect(ids).not.toContain('pumps');
    expect(await undoWords(again)).toContain('Pumps');
    await again.keyboard.press('Control+z');
    await again.keyboard.press('Control+z');
    await settled(again);
    expect((await savedStudy(again)).elements).toHaveLength(9);
    await context.close();
  });

  test('the whole browser is killed 250 ms after an edit: all is there again', async ({ baseURL }) => {
    test.setTimeout(120_000);
    const profile = mkdtempSync(join(tmpdir(), 'varwright-'));
    const first = await ownBrowser(profile, 9331);
    const page = await first.page();
    await page.goto(`${baseURL}/?sample=cold-store`);
    await settled(page);
    await remove(page, 'hoist');
    await page.waitForTimeout(250);
    await first.kill();

    const second = await ownBrowser(profile, 9332);
    const again = await second.page();
    await again.goto(`${baseURL}/`);
    await settled(again);
    await expect(part(again, /Fans/)).toBeVisible();
    await expect(again.locator('[data-subject="element:hoist"]')).toHaveCount(0);
    expect(await undoWords(again)).toContain('Hoist');
    await second.kill();
    rmSync(profile, { recursive: true, force: true });
  });
});

/** A browser of the test's own whose process can be killed, on a profile that outlives it. */
async function ownBrowser(profile: string, port: number) {
  const path = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';
  const child = spawn(
    path,
    [
      '--headless=new',
      '--no-sandbox',
      '--disable-gpu',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      `--user-data-dir=${profile}`,
      `--remote-debugging-port=${port}`,
      'about:blank',
    ],
    { stdio: 'ignore' },
  );
  const ended = new Promise((resolve) => child.once('exit', resolve));
  let browser: Browser | null = null;
  for (let attempt = 0; !browser; attempt += 1) {
    try {
      browser = await chromium.connectOverCDP(`http://127.0.0.1:${port}`);
    } catch (error) {
      if (attempt > 60) throw error;
      await new Promise((resolve) => setTimeout(resolve, 250));
    }
  }
  return {
    page: async () => {
      const context = browser.contexts()[0];
      if (!context) throw new Error('the browser has no context');
      return context.newPage();
    },
    kill: async () => {
      child.kill('SIGKILL');
      await ended;
    },
  };
}

test.describe('storage that cannot be used', () => {
  test('blocked: work goes on, it is said, and a file is offered', async ({ page }) => {
    await saveByDownload(page);
    await page.addInitScript(() => {
      IDBFactory.prototype.open = () => {
        throw new DOMException('The operation is insecure.', 'SecurityError');
      };
    });
    await openSampleSite(page, 'cold-store');
    await remove(page, 'hoist');
    await settled(page);
    await expect(notices(page)).toContainText('could not be kept in this browser');
    await expect(notices(page)).toContainText('Work goes on');
    await expect(page.locator('.study-title')).toContainText('not kept in this browser');
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      notices(page).getByRole('button', { name: 'Save to a file' }).click(),
    ]);
    expect(download.suggestedFilename()).toContain('cold-store');
    await command(page, 'Earlier states');
    await expect(drawer(page, /^Earlier states/)).toContainText('Nothing can be kept in this browser');
  });

  test('full: it is said once, and once more only after it could be kept in between', async ({ page }) => {
    await page.addInitScript(() => {
      const put = IDBObjectStore.prototype.put;
      IDBObjectStore.prototype.put = function (...given: Parameters<IDBObjectStore['put']>) {
        if ('full' in window) throw new DOMException('full', 'QuotaExceededError');
        return put.apply(this, given);
      };
    });
    await openSampleSite(page, 'cold-store');
    await page.evaluate(() => Object.assign(window, { full: true }));
    await remove(page, 'hoist');
    await expect(notices(page)).toContainText('its storage is full');
    await notices(page).getByRole('button', { name: 'Dismiss' }).click();
    await remove(page, 'pumps');
    await settled(page);
    await expect(notices(page)).not.toContainText('its storage is full');
    await expect(page.locator('.study-title')).toContainText('not kept in this browser');
    await page.evaluate(() => Reflect.deleteProperty(window, 'full'));
    await remove(page, 'fans');
    await expect(page.locator('.study-title')).not.toContainText('not kept');
  });
});

test('one study in two tabs: the second only looks, takes over with everything, or makes a copy', async ({
  context,
}) => {
  test.setTimeout(120_000);
  const first = await context.newPage();
  await saveByDownload(first);
  await openSampleSite(first, 'cold-store');
  await remove(first, 'hoist');
  await first.waitForTimeout(400);

  const second = await context.newPage();
  await saveByDownload(second);
  await second.goto('/');
  await settled(second);
  await expect(notices(second)).toContainText('is being worked on in another tab');
  await expect(notices(first)).toContainText('was opened in another tab');
  await second.locator('[data-subject="element:fans"] .hit').first().click();
  await second.keyboard.press('Delete');
  await expect(notices(second)).toContainText('Nothing was changed');
  await expect(second.locator('[data-subject="element:fans"]')).toHaveCount(1);
  await accessible(second);

  await remove(first, 'pumps');
  await notices(second).getByRole('button', { name: 'Work here instead' }).click();
  await expect(second.locator('[data-subject="element:pumps"]')).toHaveCount(0);
  await expect(notices(first)).toContainText('taken over by another tab');
  await remove(second, 'fans');
  expect(await undoWords(second)).toContain('Fans');
  await expect(first.locator('[data-subject="element:fans"]')).toHaveCount(1);

  await notices(first).getByRole('button', { name: 'Make a copy' }).click();
  await expect(first.locator('.study-title')).toContainText('as found, copy');
  await remove(first, 'defrost');
  await expect(notices(first)).not.toContainText('another tab');
  expect((await savedStudy(first)).elements.map(({ id }) => id)).toContain('fans');
});

test('earlier states: look at one and return, go back to it as one step, keep one under a name', async ({
  page,
}) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
  const found = await savedStudy(page);
  await remove(page, 'hoist');
  await page.waitForTimeout(800);
  await remove(page, 'fans');
  await page.waitForTimeout(800);
  await command(page, 'Earlier states');
  const states = drawer(page, /^Earlier states/);
  await states.getByLabel('Keep the present state as').fill('fewer drives');
  await page.keyboard.press('Enter');
  await expect(states.locator('.state').first()).toContainText('fewer drives');
  await accessible(page);

  const opened = states.getByRole('button', { name: /opened/ });
  await opened.click();
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(1);
  await expect(notices(page)).toContainText('Looking at the state of');
  await notices(page).getByRole('button', { name: 'Return to the present' }).click();
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(0);
  await opened.click();
  await page.keyboard.press('Escape');
  await expect(states).toBeHidden();
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(0);

  await command(page, 'Earlier states');
  await opened.click();
  await states.getByRole('button', { name: 'Go back to this state' }).click();
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(1);
  await page.keyboard.press('Escape');
  await settled(page);
  expect((await savedStudy(page)).elements).toEqual(found.elements);
  expect(await undoWords(page)).toMatch(/^go back to the state of \d\d:\d\d$/);
  await page.keyboard.press('Control+z');
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(0);
});

test('recent studies come back with changes that were in no file', async ({ page }) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
  await remove(page, 'hoist');
  await settled(page);
  await page.waitForTimeout(600);
  await command(page, 'New study, 50');
  await page.getByRole('button', { name: 'Leave the changes' }).click();
  const recent = page.getByRole('region', { name: 'Recent studies' });
  await expect(recent).toContainText('Brackwater cold store · as found');
  await accessible(page);
  await page.locator('.study-title').click();
  await page.getByRole('menuitem', { name: 'Recent studies' }).press('ArrowRight');
  await expect(page.getByRole('menuitem', { name: /Brackwater/ })).toContainText('changed since');
  await page.keyboard.press('Enter');
  await settled(page);
  await expect(page.locator('[data-subject="element:hoist"]')).toHaveCount(0);
  expect(await undoWords(page)).toContain('Hoist');
});

test('parts of another study are brought under a busbar as one edit, spectra along, and Escape leaves no trace', async ({
  page,
}) => {
  await saveByDownload(page);
  await openSampleSite(page, 'cold-store');
  const before = await savedStudy(page);
  const other = JSON.parse(sampleText('office-tower'));
  other.spectra = [{ id: 'air', name: 'Air, measured', orders: [{ h: 5, percent: 31 }], origin: 'measured' }];
  other.elements.find(({ id }: { id: string }) => id === 'air').spectrum = 'air';
  const choose = async () => {
    const [chooser] = await Promise.all([
      page.waitForEvent('filechooser'),
      command(page, 'Bring parts from another'),
    ]);
    await chooser.setFiles({
      name: 'office-tower.json',
      mimeType: 'application/json',
      buffer: Buffer.from(JSON.stringify(other)),
    });
  };
  await choose();
  const parts = drawer(page, /^Bring parts/);
  await parts.getByLabel(/All that hangs from Main board/).check();
  await expect(parts.getByRole('status')).toContainText(/9 parts and 2 busbars, as one step/);
  await expect(part(page, /Desk electronics/)).toBeVisible();
  await accessible(page);
  await page.keyboard.press('Escape');
  await expect(parts).toBeHidden();
  expect(await savedStudy(page)).toEqual(before);

  await choose();
  await parts.getByLabel(/Air handlers/).check();
  await parts.getByLabel(/Chillers/).check();
  await parts.getByLabel('They will hang from').selectOption({ label: 'Drives board, 400 V' });
  await parts.getByRole('button', { name: 'Bring them' }).click();
  await settled(page);
  const after = await savedStudy(page);
  expect(after.elements.slice(before.elements.length)).toMatchObject([
    { name: 'Air handlers', bus: 'drives', spectrum: 'air' },
    { name: 'Chillers', bus: 'drives' },
  ]);
  expect(after.spectra).toMatchObject([{ name: 'Air, measured' }]);
  expect(await undoWords(page)).toBe('bring 2 parts at Drives board from Harrow Lane offices');
  await page.keyboard.press('Control+z');
  expect((await savedStudy(page)).elements).toEqual(before.elements);
});
