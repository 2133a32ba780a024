import type { RunResult } from '../../../core/index.ts';

interface Props {
  readonly result: RunResult;
  readonly onToggleRow: (line: number) => void;
  readonly selectedLine: number | null;
}

/** Keeps the place of the figure. */
export function CrossedFigure({ result }: Props) {
  return <div className="figure-empty">{result.points.length} points</div>;
}
