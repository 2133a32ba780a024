import type { RunResult } from '../../../core/index.ts';
import type { DeclaredField } from '../conditions/declaredFields.ts';
import { usePointing } from '../page/pointing.ts';
import { BootstrapCheck } from './bootstrap/BootstrapCheck.tsx';
import { DoubtAtPlace } from './DoubtAtPlace.tsx';
import { Ending } from './Ending.tsx';
import { isExact } from './isExact.ts';
import { QuantityTable } from './QuantityTable.tsx';
import { resultLabels } from './resultLabels.ts';
import { ShareLooks } from './ShareLooks.tsx';
import { resultSources } from './shareParts.ts';

interface Props {
  readonly result: RunResult;
  /** What the conditions say, by id. */
  readonly declared: ReadonlyMap<string, DeclaredField>;
}

/** How the work ended, the doubts, and the quantities. */
export function Results({ result, declared }: Props) {
  const { pointed } = usePointing();
  // Under a quantity that is folded away nobody would see a doubt.
  const inSight = new Set(result.quantities.filter((quantity) => !isExact(quantity)).map(({ id }) => id));
  const doubts = [...result.doubts, ...result.run.doubts.filter((doubt) => !result.doubts.includes(doubt))];
  const ofQuantities = doubts.filter(({ place }) => place.quantity !== undefined && inSight.has(place.quantity));
  const general = doubts.filter((doubt) => !ofQuantities.includes(doubt));
  return (
    <section className="results" aria-label="Results">
      <ShareLooks />
      <Ending result={result} />
      {general.length > 0 && (
        <div className="doubts">
          <h2>{general.length === 1 ? 'A doubt' : `${general.length} doubts`}</h2>
          {general.map((doubt) => (
            <DoubtAtPlace key={`${doubt.code} ${doubt.seen}`} doubt={doubt} result={result} isAtQuantity={false} />
          ))}
        </div>
      )}
      <div className="result-block">
        <h2>Quantities</h2>
        <QuantityTable
          result={result}
          doubts={ofQuantities}
          declared={declared}
          labels={resultLabels(result, declared)}
          sources={resultSources(result)}
          pointed={pointed?.quantity ?? null}
        />
        <BootstrapCheck result={result} />
      </div>
    </section>
  );
}
