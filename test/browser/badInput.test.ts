import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';
import { type GivenFile, StepwellPage, sampleFile, textOf } from './stepwellPage.ts';

const sheet = (content: unknown): GivenFile => ({ name: 'conditions.json', content: JSON.stringify(content) });

/** What cannot be used, and words of the reason that must be read. */
const refused: readonly (readonly [string, GivenFile, RegExp])[] = [
  ['an empty file', { name: 'empty.csv', content: '' }, /empty/i],
  [
    'a picture',
    { name: 'curve.png', content: new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0xff]) },
    /picture/i,
  ],
  [
    'a table without two columns of numbers',
    { name: 'names.csv', content: 'name;remark\na;b\nc;d\n' },
    /numbers|column/i,
  ],
  ['a sheet with a negative volume', sheet({ sheet: 1, sample: { volume_mL: -3 } }), /sample\.volume_mL.*-3/],
  ['a sheet with an unknown key', sheet({ sheet: 1, sample: { colour: 'red' } }), /sample\.colour/],
  ['a sheet that is not JSON', { name: 'conditions.json', content: '{ "sheet": 1,' }, /JSON/],
  ['a sheet that contradicts itself', sheet({ sheet: 1, medium: { solvent: 'ethanol' } }), /ethanol/],
  ['a sheet of a newer version', sheet({ sheet: 99 }), /99/],
];

for (const [what, file, reason] of refused) {
  browserTest(`${what} is refused with its reason, and what was loaded stays`, async ({ page }) => {
    const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
    const before = await stepwell.quantity('pKa1');
    await stepwell.drop(file);
    const told = await stepwell.notAccepted();
    expect(told).toContain(file.name);
    expect(told).toMatch(reason);
    // Every refusal ends with what can be done about it.
    const remedies = await page.locator('.refusals li em').allInnerTexts();
    expect(remedies.length).toBeGreaterThan(0);
    expect(remedies).not.toContain('');
    expect(await stepwell.quantity('pKa1')).toEqual(before);
    expect(await page.getByRole('button', { name: 'Undo' }).isDisabled()).toBe(true);
  });
}

const rising = (count: number) => Array.from({ length: count }, (_, i) => [i * 0.5, 3 + i * 0.4] as const);
const table = (rows: readonly (readonly [unknown, unknown])[]) =>
  `V (mL),pH\n${rows.map(([volume, reading]) => `${volume},${reading}`).join('\n')}\n`;

/** What can be read but not fitted as it stands. */
const odd: readonly (readonly [string, string])[] = [
  ['two points', table(rising(2))],
  ['volumes that run backwards', table(rising(12).map(([, reading], i) => [10 - i, reading] as const))],
  ['a pH of 47', table(rising(12).map(([volume, reading], i) => [volume, i === 5 ? 47 : reading] as const))],
  [
    'text where a number belongs',
    table(rising(12).map(([volume, reading], i) => [volume, i === 5 ? 'high' : reading])),
  ],
];

for (const [what, content] of odd) {
  browserTest(`${what}: the page says so, without a stack trace or a NaN`, async ({ page }) => {
    const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
    await stepwell.drop({ name: 'odd.csv', content });
    const text = await textOf(page.locator('main'));
    expect(text).not.toMatch(/NaN|undefined|\bat .*\.(js|ts):\d+/);
    const said = [await textOf(page.locator('.ending')), ...(await page.locator('.doubt').allInnerTexts())].join(' ');
    const isFitted = (await stepwell.ending()) === 'fitted';
    const doubts = await page.locator('.doubt').count();
    // Either the run was not fitted and the ending says why, or there is a doubt about it.
    expect(isFitted ? doubts : said.length, said).toBeGreaterThan(isFitted ? 0 : 20);
    await stepwell.undo();
    expect(await stepwell.ending()).toBe('fitted');
  });
}

browserTest('rows that were not accepted are listed with their line', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  await stepwell.drop({ name: 'odd.csv', content: odd[3][1] });
  await page.getByRole('button', { name: /1 not accepted/ }).click();
  expect(await textOf(page.locator('.not-accepted'))).toMatch(/Line 7, column 2.*high/s);
});

browserTest('of several files, those that can be read are opened and the others told', async ({ page }) => {
  const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
  await stepwell.drop(sampleFile('citric-acid.csv'), { name: 'empty.csv', content: '' }, sampleFile('phthalate.txt'));
  expect(await stepwell.notAccepted()).toContain('empty.csv');
  await page.getByRole('navigation', { name: 'Runs' }).getByRole('button', { name: 'phthalate.txt' }).click();
  await stepwell.isSettled();
  expect(await textOf(page.locator('.run-choice[aria-current]'))).toBe('phthalate.txt');
});
