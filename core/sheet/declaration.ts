/**
 * What the chemist says about one quantity. `assumed` marks a default that
 * nobody has confirmed; a fitted quantity is never assumed, its value comes
 * from the run.
 */
export type Declaration =
  | { readonly state: 'fixed'; readonly value: number; readonly assumed: boolean }
  | {
      readonly state: 'known';
      readonly value: number;
      /** Standard uncertainty, in the unit of the value; positive. */
      readonly u: number;
      /** Quantities that name the same source share one error. Null: an error of its own. */
      readonly source: string | null;
      readonly assumed: boolean;
    }
  | { readonly state: 'fitted'; readonly start: number | null; readonly assumed: false };
