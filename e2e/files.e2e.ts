import { expect, type Page, test } from '@playwright/test';
import { sampleText } from './engineSays.ts';
import { saveByDownload, savedStudy, settled } from './workbench.ts';

async function dropFile(page: Page, name: string, text: string): Promise<void> {
  const data = await page.evaluateHandle(
    ([fileName, content]) => {
      const transfer = new DataTransfer();
      transfer.items.add(new File([content as string], fileName as string, { type: 'application/json' }));
      return transfer;
    },
    [name, text],
  );
  await page.dispatchEvent('body', 'dragover', { dataTransfer: data });
  await page.dispatchEvent('body', 'drop', { dataTransfer: data });
}

test.beforeEach(async ({ page }) => {
  await saveByDownload(page);
  await page.goto('/?sample=cold-store');
  await settled(page);
});

test('a study file dropped on the window opens', async ({ page }) => {
  await dropFile(page, 'office-tower.json', sampleText('office-tower'));
  await expect(page.getByRole('button', { name: /Harrow Lane offices/ }).first()).toBeVisible();
  await settled(page);
  expect((await savedStudy(page)).title).toBe('Harrow Lane offices');
});

test('a broken file is refused with every finding, and the open study stays', async ({ page }) => {
  const before = await savedStudy(page);
  const broken = JSON.parse(sampleText('office-tower'));
  broken.elements[1].ukPercent = -4;
  broken.elements[2].bus = 'nowhere';
  await dropFile(page, 'broken.json', JSON.stringify(broken));
  const dialog = page.getByRole('alertdialog');
  await expect(dialog).toContainText('$.elements[1].ukPercent');
  await expect(dialog).toContainText('-4');
  await expect(dialog).toContainText('$.elements[2].bus');
  await expect(dialog).toContainText('nowhere');
  await page.keyboard.press('Escape');
  await expect(dialog).toBeHidden();
  expect(await savedStudy(page)).toEqual(before);
});

test('a file that is not JSON is refused by line and column', async ({ page }) => {
  await dropFile(page, 'notes.txt', 'kvar: lots\n');
  await expect(page.getByRole('alertdialog')).toContainText(/line 1/i);
});

test('a study with changes in no file is not replaced unasked', async ({ page }) => {
  await page.locator('[data-subject="element:hoist"]').click();
  await page.keyboard.press('Delete');
  await settled(page);
  await dropFile(page, 'office-tower.json', sampleText('office-tower'));
  const dialog = page.getByRole('alertdialog');
  await expect(dialog).toContainText('has changes that are in no file');
  await page.getByRole('button', { name: 'Stay here' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByRole('button', { name: /Brackwater cold store/ }).first()).toBeVisible();

  await dropFile(page, 'office-tower.json', sampleText('office-tower'));
  const [saved] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save it first' }).click(),
  ]);
  expect(saved.suggestedFilename()).toContain('cold-store');
  await expect(page.getByRole('button', { name: /Harrow Lane offices/ }).first()).toBeVisible();
});
