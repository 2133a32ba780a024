/** What long work yields between its steps. */
export interface Progress {
  /** What is being done, in a few words. */
  readonly doing: string;
  /** Share done, 0–1; null where it cannot be said. */
  readonly share: number | null;
}
