import type { RunResult } from '../../../core/index.ts';
import type { DeclaredField } from '../conditions/declaredFields.ts';
import { CorrelationFigure } from './CorrelationFigure.tsx';
import { EquivalenceTable } from './EquivalenceTable.tsx';
import { Ladder } from './Ladder.tsx';
import { resultLabels } from './resultLabels.ts';
import { StandingOut } from './StandingOut.tsx';
import { resultSources } from './shareParts.ts';

interface Props {
  readonly result: RunResult;
  /** What the conditions say, by id. */
  readonly declared: ReadonlyMap<string, DeclaredField>;
}

/** What stands beside the quantities: equivalence volumes, points that stand out, how many pKa values, correlation. */
export function MoreResults({ result, declared }: Props) {
  const { ending, equivalence, ladder, correlation, robust } = result;
  const labels = resultLabels(result, declared);
  return (
    <section className="more-results" aria-label="Further results">
      <div className="result-column">
        {equivalence.length > 0 && (
          <div className="result-block">
            <h2>Equivalence volumes in mL</h2>
            <EquivalenceTable results={equivalence} labels={labels} sources={resultSources(result)} />
          </div>
        )}
        {robust !== null && ending.code === 'fitted' && (
          <div className="result-block">
            <h2>Points that stand out</h2>
            <StandingOut result={result} labels={labels} />
          </div>
        )}
      </div>
      <div className="result-column">
        {ladder !== null && (
          <div className="result-block">
            <h2>How many pKa values?</h2>
            <Ladder ladder={ladder} />
          </div>
        )}
        {correlation.ids.length > 1 && (
          <div className="result-block">
            <h2>Correlation</h2>
            <CorrelationFigure correlation={correlation} labels={labels} />
          </div>
        )}
      </div>
    </section>
  );
}
