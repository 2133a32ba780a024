import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';
import { StepwellPage, sampleFile } from './stepwellPage.ts';

/** Looking at every element takes seconds on a busy machine. */
const timeout = 180_000;

/** Violations of any rule within `part` of the page, with the elements concerned. */
async function violations(page: Page, part = 'html'): Promise<string[]> {
  // Legacy mode opens no second page, which would count as a window the person did not ask for.
  const { violations: found } = await new AxeBuilder({ page }).setLegacyMode(true).include(part).analyze();
  return found.flatMap(({ id, nodes }) => nodes.map(({ html, failureSummary }) => `${id}: ${html} ${failureSummary}`));
}

for (const colorScheme of ['light', 'dark'] as const) {
  const open = async (page: Page) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    return StepwellPage.open(page, inject('singleFileAddress'));
  };

  browserTest(`nothing on the page keeps anybody out (${colorScheme})`, { timeout }, async ({ page }) => {
    const stepwell = await open(page);
    await stepwell.drop(sampleFile('citric-acid.csv'), { name: 'empty.csv', content: '' });
    await page.getByRole('button', { name: /^More conditions/ }).click();
    await page.getByRole('button', { name: '75 points' }).click();
    await page.getByRole('button', { name: /taken as exact/ }).click();
    await page.getByRole('button', { name: /profile of pKa₁/ }).click();
    for (const summary of await page.locator('summary').all()) await summary.click();
    expect(await violations(page)).toEqual([]);
  });

  browserTest(`no form keeps anybody out (${colorScheme})`, { timeout }, async ({ page }) => {
    const stepwell = await open(page);
    for (const label of ['titrant strength', 'form weighed', 'temperature']) {
      await stepwell.field(label).click();
      expect(await violations(page, '.popover'), label).toEqual([]);
      await page.keyboard.press('Escape');
    }
    await page.getByRole('button', { name: 'Samples' }).click();
    expect(await violations(page, '.masthead'), 'list of samples').toEqual([]);
  });
}

browserTest('no part of the page is wider than a telephone', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  expect(await stepwell.overflow(), 'fitted').toBe(0);
  await page.getByRole('button', { name: /profile of pKa₁/ }).click();
  for (const summary of await page.locator('summary').all()) await summary.click();
  expect(await stepwell.overflow(), 'with all that is folded opened').toBe(0);
  await stepwell.field('titrant strength').click();
  expect(await stepwell.overflow(), 'with a form').toBe(0);
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: 'Samples' }).click();
  expect(await stepwell.overflow(), 'with the list of samples').toBe(0);
  await page.keyboard.press('Escape');
  await stepwell.openSample(/millivolts/);
  expect(await stepwell.overflow(), 'in millivolts').toBe(0);
  await stepwell.drop(sampleFile('citric-acid.csv'), { name: `${'long'.repeat(30)}.csv`, content: '' });
  await page.getByRole('button', { name: '75 points' }).click();
  await page.getByRole('button', { name: /^More conditions/ }).click();
  expect(await stepwell.overflow(), 'assumed, refused, with all conditions and points').toBe(0);
});
