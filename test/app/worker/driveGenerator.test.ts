import { expect, test } from 'vitest';
import { driveGenerator } from '../../../app/worker/driveGenerator.ts';

function* countTo(last: number): Generator<number, string> {
  for (let step = 1; step <= last; step++) yield step;
  return 'done';
}

/** A clock that every look at it moves on. */
function hooksWith(millisecondsPerLook: number, stopAfter = Number.POSITIVE_INFINITY) {
  let time = 0;
  const reported: number[] = [];
  let pauses = 0;
  return {
    reported,
    pauses: () => pauses,
    now: () => (time += millisecondsPerLook),
    pause: async () => {
      pauses++;
    },
    isStopped: () => pauses >= stopAfter,
    report: (step: number) => reported.push(step),
  };
}

test('short work ends without a pause', async () => {
  const hooks = hooksWith(0);
  expect(await driveGenerator(countTo(1000), hooks)).toEqual({ value: 'done' });
  expect(hooks.pauses()).toBe(0);
});

test('long work pauses after each slice of 30 ms and reports where it is', async () => {
  const hooks = hooksWith(10);
  expect(await driveGenerator(countTo(9), hooks)).toEqual({ value: 'done' });
  // One look at the clock for each step, and one at the beginning of each slice.
  expect(hooks.reported).toEqual([3, 6, 9]);
});

test('work that is stopped gives nothing', async () => {
  const hooks = hooksWith(10, 2);
  expect(await driveGenerator(countTo(1000), hooks)).toBe(null);
  expect(hooks.reported).toEqual([3, 6]);
});

test('a mistake in the work reaches the caller', async () => {
  // biome-ignore lint/correctness/useYield: it fails before it can yield
  function* failing(): Generator<number, string> {
    throw new Error('broken');
  }
  await expect(driveGenerator(failing(), hooksWith(0))).rejects.toThrow('broken');
});
