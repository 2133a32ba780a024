import type { RunResult } from '../../../core/index.ts';
import { DoubtNote } from '../../widgets/DoubtNote.tsx';
import type { DeclaredField } from '../conditions/declaredFields.ts';
import { EquivalenceTable } from './EquivalenceTable.tsx';
import { noiseWords } from './noiseWords.ts';
import { QuantityTable } from './QuantityTable.tsx';

interface Props {
  readonly result: RunResult;
  /** What the conditions say, by id. */
  readonly declared: ReadonlyMap<string, DeclaredField>;
}

/** Everything the run says: how the work ended, quantities, equivalence volumes, doubts. */
export function Results({ result, declared }: Props) {
  const { ending, quantities, equivalence, noise, ladder } = result;
  const ids = new Set(quantities.map(({ id }) => id));
  const doubts = [...result.doubts, ...result.run.doubts.filter((doubt) => !result.doubts.includes(doubt))];
  const ofQuantities = doubts.filter(({ place }) => place.quantity !== undefined && ids.has(place.quantity));
  const general = doubts.filter((doubt) => !ofQuantities.includes(doubt));
  const isSuccess = ending.code === 'fitted' || ending.code === 'predicted';
  return (
    <section className="results" aria-label="Results">
      <p className={`ending${isSuccess ? '' : ' failed'}`} data-ending={ending.code}>
        {ending.message}
        {noise !== null && <span className="noise"> {noiseWords(noise)}</span>}
      </p>
      <div className="result-block">
        <h2>Quantities</h2>
        <QuantityTable
          quantities={quantities}
          isFitted={ending.code === 'fitted'}
          doubts={ofQuantities}
          declared={declared}
        />
      </div>
      <div className="results-aside">
        {general.length > 0 && (
          <div className="doubts">
            <h2>{general.length === 1 ? 'A doubt' : `${general.length} doubts`}</h2>
            {general.map((doubt) => (
              <DoubtNote key={`${doubt.code} ${doubt.seen}`} doubt={doubt} />
            ))}
          </div>
        )}
        {equivalence.length > 0 && (
          <div className="result-block">
            <h2>Equivalence volumes in mL</h2>
            <EquivalenceTable results={equivalence} />
          </div>
        )}
        {ladder !== null && (
          <div className="result-block">
            <h2>How many pKa values?</h2>
            <p>{ladder.sentence}</p>
          </div>
        )}
      </div>
    </section>
  );
}
