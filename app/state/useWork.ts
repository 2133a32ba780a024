import { useStore } from 'zustand';
import { type WorkState, workStore } from './workStore.ts';

/** What follows from the inputs, in a component. */
export function useWork<Part>(select: (state: WorkState) => Part): Part {
  return useStore(workStore, select);
}
