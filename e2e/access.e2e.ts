import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { settled } from './workbench.ts';

const places = ['Site', 'Correction', 'Sheet'] as const;

for (const colorScheme of ['light', 'dark'] as const) {
  test(`no accessibility violations in any place, ${colorScheme}`, async ({ browser }) => {
    const context = await browser.newContext({ colorScheme, reducedMotion: 'reduce' });
    const page = await context.newPage();
    await page.goto('/?sample=cold-store');
    await settled(page);
    for (const place of places) {
      await page.getByRole('button', { name: place, exact: true }).click();
      await settled(page);
      const { violations } = await new AxeBuilder({ page })
        .withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
        .analyze();
      expect(
        violations.map(({ id, nodes }) => `${place}: ${id}: ${nodes.map((node) => node.html).join(' | ')}`),
      ).toEqual([]);
    }
    await context.close();
  });
}
