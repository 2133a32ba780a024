import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';
import { StepwellPage, textOf } from './stepwellPage.ts';

/** Three thousand fits take seconds, and many on a busy machine. */
const timeout = 90_000;

/** Lets the page believe that it runs on a machine with so many cores, which decides how many workers it starts. */
async function pretendCores(page: Page, cores: number): Promise<void> {
  await page.addInitScript((count) => {
    Object.defineProperty(Navigator.prototype, 'hardwareConcurrency', { get: () => count, configurable: true });
  }, cores);
}

/** Waits for a state of the check. */
const checkIs = (page: Page, state: string) => page.locator(`.bootstrap[data-state="${state}"]`).waitFor();

const startCheck = (page: Page, words: string) => page.getByRole('button', { name: words }).click();

/** All that the finished check prints. */
const findings = async (page: Page) => textOf(page.locator('.bootstrap'));

browserTest(
  'a check by simulation shows progress, stops at once, and can be started again',
  { timeout },
  async ({ page }) => {
    await StepwellPage.open(page, inject('singleFileAddress'));
    await startCheck(page, 'Check by simulation');
    await page.waitForFunction(() => {
      const bar = document.querySelector('.bootstrap progress');
      return bar instanceof HTMLProgressElement && bar.value > 0 && bar.value < bar.max;
    });

    const milliseconds = await page.evaluate(async () => {
      const check = document.querySelector('.bootstrap');
      const stop = [...(check?.querySelectorAll('button') ?? [])].find((button) => button.textContent === 'Stop');
      if (!check || stop === undefined) throw new Error('There is nothing to stop.');
      const stopped = new Promise<number>((told) => {
        new MutationObserver(() => {
          if (check.getAttribute('data-state') !== 'stopped') return;
          told(performance.now());
        }).observe(check, { attributes: true });
      });
      const clicked = performance.now();
      stop.click();
      return (await stopped) - clicked;
    });
    // From the click to the word in the page: workers are ended, not waited for, so that 200 ms is hundreds of times what
    // it takes. When the browser draws the word depends on what else the machine does, and is left out.
    expect(milliseconds).toBeLessThan(200);
    const [, done, asked] = /Stopped after (\d+) of ([\d,]+) repetitions/.exec(await findings(page)) ?? [];
    expect(Number(done)).toBeGreaterThan(0);
    expect(Number(done)).toBeLessThan(1000);
    expect(asked).toBe('1,000');

    await startCheck(page, 'Start again');
    await checkIs(page, 'done');
    expect(await findings(page)).toContain('1,000 repetitions, seed 1; all could be fitted.');
    const rows = await page.locator('[data-compared]').evaluateAll((bodies) =>
      bodies.map((body) => ({
        id: body.getAttribute('data-compared'),
        agrees: body.getAttribute('data-agrees'),
        u: [...body.querySelectorAll('tr')].map((row) => Number(row.getAttribute('data-u'))),
      })),
    );
    expect(rows.slice(0, 4).map(({ id }) => id)).toEqual(['pKa1', 'pKa2', 'pKa3', 'concentration']);
    for (const { id, agrees, u } of rows) {
      expect(agrees, id ?? '').toBe('true');
      // A standard deviation of 1,000 draws is uncertain by 2.2 %; 10 % is more than four times that.
      expect(Math.abs(u[1] / u[0] - 1), `u of ${id}`).toBeLessThan(0.1);
    }

    // Legacy mode opens no second page, which would count as a window the person did not ask for.
    const { violations } = await new AxeBuilder({ page }).setLegacyMode(true).include('.bootstrap').analyze();
    expect(violations.map((violation) => violation.id)).toEqual([]);
    // A telephone's width.
    await page.setViewportSize({ width: 390, height: 800 });
    const room = await page.locator('.bootstrap').evaluate(({ clientWidth, scrollWidth }) => clientWidth - scrollWidth);
    expect(room).toBeGreaterThanOrEqual(0);
  },
);

browserTest(
  'one worker and two print the same numbers; changed conditions drop them',
  { timeout },
  async ({ page }) => {
    const check = async (cores: number) => {
      await pretendCores(page, cores);
      const stepwell = await StepwellPage.open(page, inject('singleFileAddress'));
      const before = page.workers().length;
      await startCheck(page, 'Check by simulation');
      await page.waitForFunction(
        () => (document.querySelector('.bootstrap progress') as HTMLProgressElement).value > 0,
      );
      expect(page.workers().length - before).toBe(cores);
      await checkIs(page, 'done');
      return { stepwell, numbers: await findings(page) };
    };
    const alone = await check(1);
    const { stepwell, numbers } = await check(2);
    expect(numbers).toMatch(/fit0\.\d+.*simulation0\.\d+/);
    expect(numbers).toBe(alone.numbers);
    // The workers of the check have gone, that of the fits is left.
    expect(page.workers().length).toBe(1);

    await stepwell.changeValue('sample volume', '24.9');
    await checkIs(page, 'none');
    expect(await page.locator('[data-compared]').count()).toBe(0);
  },
);
