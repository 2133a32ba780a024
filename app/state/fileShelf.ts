import type { Run } from '../../core/index.ts';

/** A file as it came, and the runs read from it. */
export interface ShelvedFile {
  readonly name: string;
  readonly bytes: Uint8Array;
  readonly runs: readonly Run[];
}

/**
 * The files that inputs refer to, by SHA-256 of their bytes and name. Outside undo: what is undone may be done again,
 * and then needs its file.
 */
const files = new Map<string, ShelvedFile>();

export const fileShelf = {
  put(key: string, file: ShelvedFile): void {
    files.set(key, file);
  },
  get(key: string): ShelvedFile {
    const file = files.get(key);
    if (file === undefined) throw new Error('An input refers to a file that was never read, or is forgotten.');
    return file;
  },
  /** Forgets every file that no input refers to any more, now or by undo. */
  keepOnly(keys: ReadonlySet<string>): void {
    for (const key of files.keys()) if (!keys.has(key)) files.delete(key);
  },
};
