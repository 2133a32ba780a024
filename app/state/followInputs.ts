import type { RunResult } from '../../core/index.ts';
import type { AnalysisClient } from '../worker/analysisClient.ts';
import { decidedRun } from './decidedRun.ts';
import { inputStore } from './inputStore.ts';
import type { RunInput } from './inputs.ts';
import { workStore } from './workStore.ts';

/** Results kept for going back and forth; each is some ten kilobytes. */
const mostResults = 40;

/**
 * Keeps the result of the shown run in step with the inputs. An answer belongs to the input that asked for it: where
 * another is shown by then, the answer is kept for it but not shown.
 *
 * @returns `stop` ends the work in progress, `retry` starts it again
 */
export function followInputs(client: Pick<AnalysisClient, 'analyse'>) {
  const results = new Map<RunInput, RunResult>();
  let shown: RunInput | undefined;
  let stopWork: (() => void) | null = null;

  const keep = (input: RunInput, result: RunResult) => {
    results.set(input, result);
    for (const oldest of results.keys()) {
      if (results.size <= mostResults) break;
      results.delete(oldest);
    }
  };

  const start = (input: RunInput) => {
    workStore.setState({ work: { state: 'working', progress: { doing: 'starting', share: null } } });
    const { answer, stop } = client.analyse(decidedRun(input), input.sheet, (progress) => {
      if (shown === input) workStore.setState({ work: { state: 'working', progress } });
    });
    stopWork = stop;
    answer.then((reply) => {
      if (reply.kind === 'analysed' && reply.outcome.ok) keep(input, reply.outcome.value);
      if (shown !== input) return;
      stopWork = null;
      if (reply.kind === 'stopped') workStore.setState({ work: { state: 'stopped' } });
      else if (reply.kind === 'broken') workStore.setState({ work: { state: 'broken', message: reply.message } });
      else if (!reply.outcome.ok) workStore.setState({ work: { state: 'refused', refusals: reply.outcome.refusals } });
      else workStore.setState({ work: { state: 'idle' }, latest: { input, result: reply.outcome.value } });
    });
  };

  const follow = () => {
    const { present } = inputStore.getState();
    const input = present.runs[present.shown];
    if (input === shown) return;
    const isSameRun = shown !== undefined && input?.file === shown.file && input.index === shown.index;
    stopWork?.();
    stopWork = null;
    shown = input;
    const known = input === undefined ? undefined : results.get(input);
    if (input === undefined) workStore.setState({ work: { state: 'idle' }, latest: null });
    else if (known !== undefined) workStore.setState({ work: { state: 'idle' }, latest: { input, result: known } });
    else {
      // The result of another run must not stand under this one's name, not even for a moment.
      if (!isSameRun) workStore.setState({ latest: null });
      start(input);
    }
  };

  inputStore.subscribe(follow);
  follow();
  return {
    stop: () => stopWork?.(),
    retry: () => {
      if (shown !== undefined && stopWork === null) start(shown);
    },
  };
}
