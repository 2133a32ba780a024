import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';
import { StepwellPage, sampleFile, textOf } from './stepwellPage.ts';

// The fixture fails a test whose page writes to the console or asks for anything that is not its own.

browserTest('the profile of a quantity opens from its interval, and closes', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  const { value, u } = await stepwell.quantity('pKa2');
  const interval = page.getByRole('button', { name: /profile of pKa₂/ });
  await interval.focus();
  await page.keyboard.press('Enter');
  const profile = page.locator('.profile');
  const written = (await profile.locator('svg text').allTextContents()).map(Number).filter((number) => number > 0);
  // The ends of the interval stand at the axis, two standard uncertainties about the value within what is printed.
  expect(written).toContain(value);
  expect(Math.min(...written.filter((number) => number > 5)) - (value - 1.96 * u)).toBeCloseTo(0, 3);
  expect(await textOf(profile)).toContain('Both give the same interval.');
  await page.keyboard.press('Enter');
  await profile.waitFor({ state: 'detached' });
});

browserTest('every correlation is told by pointing and by keys', async ({ page }) => {
  await StepwellPage.open(page, inject('singleFileAddress'));
  const told = page.locator('.correlation-number');
  expect(await textOf(told)).toMatch(/^Strongest: .+ with .+: −?0\.\d\d$/);
  await page.getByRole('button', { name: /^pKa₂ with pKa₁/ }).hover();
  const first = await textOf(told);
  expect(first).toMatch(/^pKa₂ with pKa₁: 0\.\d\d$/);
  await page.getByRole('button', { name: /^pKa₂ with pKa₁/ }).focus();
  await page.keyboard.press('ArrowDown');
  expect(await textOf(told)).toMatch(/^pKa₃ with pKa₁: 0\.\d\d$/);
});

browserTest('how many pKa values: the answer, and on request every number of groups', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  const block = page.locator('.result-block', { hasText: 'How many pKa values?' });
  expect(await textOf(block.locator('strong').first())).toBe('This run shows 3 ionisable groups, as declared.');
  await block.getByText('Other numbers of groups', { exact: true }).click();
  const shown = block.locator('tr.chosen');
  expect(await textOf(shown)).toMatch(/^3/);
  expect(await block.locator('.rung.chosen').count()).toBe(1);
  // Every rung of the table that could be fitted is a mark of the figure.
  const fitted = await block.locator('.rungs tbody tr:not(.remark-row):not(:has(.why))').count();
  expect(await block.locator('.ladder-figure > svg .rung').count()).toBe(fitted);
  await stepwell.openSample(/millivolts/);
  expect(await textOf(block.locator('strong').first())).toMatch(/^This run shows no ionisable group/);
});

browserTest('a doubt marks the place that it is about', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  // One reading far from its place is a doubt about that line.
  const text = new TextDecoder().decode(sampleFile('om-217.csv').content as Uint8Array);
  const lines = text.split('\n');
  const wild = lines.length - 22;
  const cells = lines[wild].split(',');
  cells[3] = (Number(cells[3]) + 0.2).toFixed(3);
  lines[wild] = cells.join(',');
  await stepwell.drop({ name: 'wild.csv', content: lines.join('\n') }, sampleFile('om-217.sheet.json'));
  const points = page.locator('.result-block', { hasText: 'Points that stand out' });
  const button = points.getByRole('button', { name: `line ${wild + 1}`, exact: true });
  await button.click();
  expect(await page.locator('.figure-selected circle').count()).toBeGreaterThan(0);
  expect(await button.getAttribute('aria-pressed')).toBe('true');
  await page.keyboard.press('Escape');
  expect(await page.locator('.figure-selected').count()).toBe(0);
});

browserTest('where the variance of an answer comes from is drawn and told', async ({ page }) => {
  await StepwellPage.open(page, inject('singleFileAddress'));
  const shares = page.locator('tr[data-quantity="concentration"] ~ tr .shares').first();
  const parts = [...(await textOf(shares)).matchAll(/(\d+)\s%/g)].map(([, percent]) => Number(percent));
  expect(parts.reduce((sum, percent) => sum + percent, 0)).toBe(100);
  expect(await shares.locator('.share-bar rect').count()).toBe(parts.length);
});
