import { createStore } from 'zustand/vanilla';
import type { Inputs } from './inputs.ts';

interface Change {
  /** What was done, to read behind "Undo": "changed the sample volume". */
  readonly words: string;
  /** The inputs before it (in `past`) or after it (in `future`). */
  readonly inputs: Inputs;
}

export interface InputState {
  readonly present: Inputs;
  readonly past: readonly Change[];
  readonly future: readonly Change[];
}

/** More steps than anybody walks back; each holds decisions only, not files. */
const longestPast = 200;

export const noInputs: Inputs = { runs: [], shown: -1 };

/** The person's inputs and nothing else, with undo. */
export const inputStore = createStore<InputState>(() => ({ present: noInputs, past: [], future: [] }));

/** Puts new inputs in place; `words` say what was done. */
export function changeInputs(words: string, change: (inputs: Inputs) => Inputs): void {
  inputStore.setState(({ present, past }) => {
    const next = change(present);
    if (next === present) return {};
    // The run with which the page opens is where history begins.
    if (present.runs.length === 0) return { present: next };
    return { present: next, past: [...past, { words, inputs: present }].slice(-longestPast), future: [] };
  });
}

/** Looks at something else; nothing that would have to be undone. */
export function showRun(index: number): void {
  inputStore.setState(({ present }) => ({ present: { ...present, shown: index } }));
}

export function undo(): void {
  inputStore.setState(({ present, past, future }) => {
    const last = past.at(-1);
    if (last === undefined) return {};
    return {
      present: last.inputs,
      past: past.slice(0, -1),
      future: [{ words: last.words, inputs: present }, ...future],
    };
  });
}

export function redo(): void {
  inputStore.setState(({ present, past, future }) => {
    if (future.length === 0) return {};
    const [next, ...others] = future;
    return { present: next.inputs, past: [...past, { words: next.words, inputs: present }], future: others };
  });
}
