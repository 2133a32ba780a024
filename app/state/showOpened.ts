import type { SheetFile } from '../../core/index.ts';
import { fileShelf, type ShelvedFile } from './fileShelf.ts';
import { changeInputs, inputStore } from './inputStore.ts';
import type { Inputs, RunInput } from './inputs.ts';

/** A file that was read, with the conditions for its runs. */
export interface OpenedFile {
  /** Under which it is kept. */
  readonly key: string;
  readonly file: ShelvedFile;
  readonly sheet: SheetFile;
  readonly isSample: boolean;
}

/** Adds the runs of files and shows the first of them. A sample makes room for whatever is opened next. */
export function showOpened(opened: readonly OpenedFile[]): void {
  for (const { key, file } of opened) fileShelf.put(key, file);
  const added = opened.flatMap(({ key, file, sheet, isSample }) =>
    file.runs.map((_, index): RunInput => ({ file: key, index, isSample, sheet, decisions: new Map() })),
  );
  changeInputs(`opened ${opened.map(({ file }) => file.name).join(', ')}`, ({ runs }) => {
    const kept = runs.filter((run) => !run.isSample && !opened.some(({ key }) => key === run.file));
    return { runs: [...kept, ...added], shown: kept.length };
  });
  const { present, past, future } = inputStore.getState();
  const reachable: readonly Inputs[] = [present, ...[...past, ...future].map(({ inputs }) => inputs)];
  fileShelf.keepOnly(new Set(reachable.flatMap(({ runs }) => runs.map(({ file }) => file))));
}
