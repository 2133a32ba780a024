import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';

/** Openings that are measured; the first pays for what the browser itself does once. */
const openings = 3;

for (const build of ['servedAddress', 'singleFileAddress'] as const) {
  browserTest(`cold start to the fitted and drawn sample (${build})`, async ({ context, task }) => {
    // Notes when each part first stands on the page, in milliseconds from the opening of the page.
    await context.addInitScript(() => {
      const awaited = new Map([
        ['conditions', '.sentence'],
        ['fitted', '.findings[aria-busy="false"] .results'],
        ['drawn', '.figure-plot .main-svg'],
      ]);
      new MutationObserver(() => {
        for (const [name, selector] of awaited) {
          if (document.querySelector(selector) === null) continue;
          performance.mark(name);
          awaited.delete(name);
        }
      }).observe(document, { childList: true, subtree: true, attributes: true });
    });
    const times = new Map<string, number[]>();
    for (let i = 0; i < openings; i++) {
      const page = await context.newPage();
      await page.goto(inject(build));
      await page.locator('.findings[aria-busy="false"] .results').waitFor();
      await page.locator('.figure-plot .main-svg').first().waitFor();
      const marks = await page.evaluate(() =>
        performance.getEntriesByType('mark').map(({ name, startTime }) => [name, Math.round(startTime)] as const),
      );
      for (const [name, time] of marks) times.set(name, [...(times.get(name) ?? []), time]);
      await page.close();
    }
    // Printed, not asserted: how long it takes says more about the machine than about the page.
    for (const [name, list] of times)
      process.stdout.write(`${task.name}: ${name} after ${list.toSorted((a, b) => a - b).join(', ')} ms\n`);
    expect([...times.keys()].sort()).toEqual(['conditions', 'drawn', 'fitted']);
  });
}
