import type { RowDecision, Run } from './run.ts';

/** Decisions about rows by the line of the source file, so that they outlive reading the file again. */
export type DecisionsByLine = Readonly<Record<number, RowDecision>>;

/**
 * The run with the decisions that a person has taken about its rows; other
 * rows keep theirs, and lines that the run does not hold are passed over.
 * Excludes ({ use: 'excluded', by: 'person', why }) or takes back what a rule
 * has excluded ({ use: 'used', by: 'person', why }).
 */
export function applyRowDecisions(run: Run, decisions: DecisionsByLine): Run {
  if (!run.rows.some(({ line }) => Object.hasOwn(decisions, line))) return run;
  const rows = run.rows.map((row) =>
    Object.hasOwn(decisions, row.line) ? { ...row, decision: decisions[row.line] } : row,
  );
  return { ...run, rows };
}
