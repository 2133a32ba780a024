import { useStore } from 'zustand';
import type { RunResult } from '../../core/index.ts';
import { type BootstrapCheck, bootstrapStore } from './bootstrapStore.ts';

/** The check of a result, in a component; null where there is none of this result. */
export function useBootstrapCheck(result: RunResult): BootstrapCheck | null {
  const check = useStore(bootstrapStore, (state) => state.check);
  return check?.of === result ? check : null;
}
