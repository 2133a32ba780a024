import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';

// The fixture fails a test whose page writes to the console or asks for anything that is not its own.

browserTest('the page opens from disk as one file', async ({ page }) => {
  await page.goto(inject('singleFileAddress'));
  await page.getByRole('heading', { level: 1 }).waitFor();
  expect(await page.title()).toContain('Stepwell');
});

browserTest('the page opens from a server, with its icon and manifest', async ({ page }) => {
  await page.goto(inject('servedAddress'));
  await page.getByRole('heading', { level: 1 }).waitFor();
  for (const kind of ['icon', 'manifest']) {
    const address = await page.locator(`link[rel=${kind}]`).evaluate((link) => (link as HTMLLinkElement).href);
    const answer = await page.context().request.get(address);
    expect(answer.status(), address).toBe(200);
    // A server of single-page applications answers what it does not find with the page itself.
    expect(answer.headers()['content-type'], address).not.toContain('text/html');
  }
});

browserTest('the licences of what is built in stand beside the page, those of the worker too', async ({ page }) => {
  const answer = await page.context().request.get(`${inject('servedAddress')}licences.txt`);
  expect(answer.status()).toBe(200);
  const text = await answer.text();
  for (const name of ['plotly.js', 'react-dom', 'papaparse', 'ml-levenberg-marquardt'])
    expect(text).toContain(`${name} `);
  expect(text).toMatch(/MIT/);
});
