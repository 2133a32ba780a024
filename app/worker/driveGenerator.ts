/** What the driver needs from where it runs; handed in, so that it can be tested without a clock. */
export interface DriveHooks<Step> {
  /** Milliseconds, from anywhere. */
  readonly now: () => number;
  /** Returns to the event loop, so that messages can arrive. */
  readonly pause: () => Promise<void>;
  readonly isStopped: () => boolean;
  readonly report: (step: Step) => void;
}

/** Long enough that pauses cost little, short enough that a person who presses "stop" sees it stop. */
const sliceMilliseconds = 30;

/**
 * Runs long work to its end, in slices with a return to the event loop between them. Reports the latest step at the
 * end of each slice, not every one.
 *
 * @returns the value of the work, or null where it was stopped
 */
export async function driveGenerator<Step, Value>(
  work: Generator<Step, Value>,
  hooks: DriveHooks<Step>,
): Promise<{ readonly value: Value } | null> {
  let sliceEnd = hooks.now() + sliceMilliseconds;
  for (;;) {
    const step = work.next();
    if (step.done === true) return { value: step.value };
    if (hooks.now() < sliceEnd) continue;
    hooks.report(step.value);
    await hooks.pause();
    if (hooks.isStopped()) return null;
    sliceEnd = hooks.now() + sliceMilliseconds;
  }
}
