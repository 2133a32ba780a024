import { readFile } from 'node:fs/promises';
import type { Readable } from 'node:stream';
import { expect, inject } from 'vitest';
import { readRuns } from '../../core/index.ts';
import { browserTest } from './browserTest.ts';
import { noiseAllows } from './noiseAllows.ts';
import { StepwellPage, sampleFile, textOf } from './stepwellPage.ts';

// The fixture fails a test whose page writes to the console or asks for anything that is not its own.

const truthFile = new URL('../../sample-data/truth.json', import.meta.url);
type Truth = Readonly<Record<string, Readonly<Record<string, number>>>>;
const readTruth = async (): Promise<Truth> => JSON.parse(await readFile(truthFile, 'utf8'));

browserTest('the page opens from disk with a sample run, fitted', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  expect(await stepwell.ending()).toBe('fitted');
  expect(await textOf(stepwell.field('name of the substance'))).toBe('OM-217');
});

browserTest('pKa values of a dropped run are those of the truth, as sharp as its noise allows', async ({ page }) => {
  const truth = (await readTruth())['om-217.csv'];
  const run = sampleFile('om-217.csv');
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  await stepwell.openSample(/Citric acid/);
  await stepwell.drop(run, sampleFile('om-217.sheet.json'));

  const read = readRuns(run.content as Uint8Array, run.name);
  if (!read.ok) throw new Error('The sample run cannot be read.');
  const allowed = noiseAllows(
    truth,
    read.value[0].rows.map(({ volume_mL }) => volume_mL),
  );
  for (const id of ['pKa1', 'pKa2', 'pKa3', 'concentration']) {
    const { value, u } = await stepwell.quantity(id);
    const least = allowed.get(id) ?? 0;
    // Three standard uncertainties: exceeded by one run in 370, and this run is always the same.
    expect(Math.abs(value - truth[id]) / u, `${id} = ${value}`).toBeLessThan(3);
    expect(u / least, `u of ${id}`).toBeLessThan(1.5);
    // No estimate is sharper than its noise allows; the page prints two digits, up to 5 % less.
    expect(u / least, `u of ${id}`).toBeGreaterThan(0.9);
  }
});

for (const name of ['citric-acid.csv', 'phthalate.txt', 'washing-soda.csv', 'strong-acid-mv.csv']) {
  browserTest(`everything fitted of ${name} is within 3 u of the truth`, async ({ page }) => {
    const truth = (await readTruth())[name];
    const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
    await stepwell.drop(sampleFile(name), sampleFile(name.replace(/\.\w+$/, '.sheet.json')));
    expect(await stepwell.ending()).toBe('fitted');
    const fitted = await page
      .locator('tr[data-state="fitted"]')
      .evaluateAll((rows) => rows.map((row) => row.getAttribute('data-quantity') ?? ''));
    expect(fitted.length).toBeGreaterThan(0);
    for (const id of fitted) {
      const { value, u } = await stepwell.quantity(id);
      expect(Math.abs(value - truth[id]) / u, `${id} = ${value}, u ${u}`).toBeLessThan(3);
    }
  });
}

browserTest('results follow a changed condition, and come back when it is undone', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  const before = await stepwell.quantity('concentration');
  await stepwell.changeValue('titrant strength', '0,1102');
  const after = await stepwell.quantity('concentration');
  // The sample's concentration is proportional to the titrant's strength; what carbonate and activity change of that
  // is less than 1 %.
  expect(after.value / before.value / (0.1102 / 0.1002)).toBeCloseTo(1, 2);
  await stepwell.undo();
  expect(await stepwell.quantity('concentration')).toEqual(before);
  await page.keyboard.press('Control+Shift+Z');
  await stepwell.isSettled();
  expect(await stepwell.quantity('concentration')).toEqual(after);
  await page.keyboard.press('Control+Z');
  await stepwell.isSettled();
  expect(await stepwell.quantity('concentration')).toEqual(before);
});

browserTest('a field can be left without a change, and says what may not stand in it', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  const before = await stepwell.quantity('concentration');
  await stepwell.field('sample volume').click();
  await page.keyboard.type('-3');
  const form = page.getByRole('dialog', { name: 'sample volume' });
  await form.getByText(/^Here belongs a number above 0/).waitFor();
  await page.keyboard.press('Enter');
  await form.getByText(/^Here belongs/).waitFor();
  await page.keyboard.press('Escape');
  await form.waitFor({ state: 'detached' });
  expect(await stepwell.field('sample volume').evaluate((field) => field === document.activeElement)).toBe(true);
  expect(await stepwell.quantity('concentration')).toEqual(before);
  expect(await page.getByRole('button', { name: 'Undo' }).isDisabled()).toBe(true);
});

browserTest(
  'assumed values stand out until they are confirmed, and so do results that rest on them',
  async ({ page }) => {
    const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
    await stepwell.drop(sampleFile('citric-acid.csv'));
    const assumed = page.getByRole('button', { name: /, assumed$/ });
    expect(await assumed.count()).toBeGreaterThan(5);
    await page.locator('tr.remark-row', { hasText: 'rests on' }).first().waitFor();
    await page.getByRole('button', { name: 'Confirm all' }).click();
    await stepwell.isSettled();
    expect(await assumed.count()).toBe(0);
    expect(await page.locator('tr.remark-row', { hasText: 'rests on' }).count()).toBe(0);
  },
);

browserTest('conditions saved from the page are the sheet that it opens again', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  await stepwell.changeValue('titrant strength', '0.1102');
  const changed = await stepwell.quantity('concentration');
  const [saved] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save conditions' }).click(),
  ]);
  expect(saved.suggestedFilename()).toBe('om-217.sheet.json');
  const kept = await readAll(await saved.createReadStream());
  await stepwell.undo();
  await stepwell.drop({ name: 'kept.json', content: kept });
  expect(await stepwell.quantity('concentration')).toEqual(changed);
});

browserTest('substances are added and taken away, and the conditions and results follow', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  await page.getByRole('button', { name: 'More conditions' }).click();
  for (const [number, id] of [
    ['two substances', 'analyte2.concentration'],
    ['no substance', 'sample.strongIon'],
    ['one substance', 'concentration'],
  ]) {
    await stepwell.field('number of substances in the sample').click();
    await page.getByRole('dialog').getByRole('button', { name: number }).click();
    await stepwell.isSettled();
    expect(await page.locator(`tr[data-quantity="${id}"]`).count(), number).toBe(1);
  }
});

browserTest('a point is taken out and put back by keyboard, and every row stays on the page', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  const before = await stepwell.quantity('pKa2');
  await page.getByRole('button', { name: '82 points' }).click();
  const box = page.getByRole('checkbox', { name: 'use line 30' });
  await box.focus();
  await page.keyboard.press('Space');
  await stepwell.isSettled();
  expect(await textOf(page.locator('tr.excluded'))).toContain('taken out by hand');
  expect(await page.locator('.points tbody tr').count()).toBe(82);
  expect(await stepwell.quantity('pKa2')).not.toEqual(before);
  await page.keyboard.press('Space');
  await stepwell.isSettled();
  expect(await stepwell.quantity('pKa2')).toEqual(before);
});

async function readAll(stream: Readable): Promise<string> {
  const pieces: Buffer[] = [];
  for await (const piece of stream) pieces.push(piece);
  return Buffer.concat(pieces).toString('utf8');
}
