import { useStore } from 'zustand';
import { type InputState, inputStore } from './inputStore.ts';

/** The inputs, in a component. */
export function useInputs<Part>(select: (state: InputState) => Part): Part {
  return useStore(inputStore, select);
}
