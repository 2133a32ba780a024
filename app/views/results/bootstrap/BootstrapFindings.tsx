import type { RunResult } from '../../../../core/index.ts';
import type { BootstrapCheck } from '../../../state/bootstrapStore.ts';
import { BootstrapTable } from './BootstrapTable.tsx';
import { bootstrapRemarks } from './bootstrapRemarks.ts';
import { compareIntervals } from './compareIntervals.ts';
import { withThousands } from './withThousands.ts';

interface Props {
  readonly check: BootstrapCheck & { readonly state: 'done' };
  readonly result: RunResult;
}

/** What the repetitions say of the intervals. */
export function BootstrapFindings({ check, result }: Props) {
  const { summaries, failed, count, seed } = check;
  const compared = compareIntervals(result.quantities, summaries);
  const remarks = bootstrapRemarks(compared, failed, count, result.noise);
  const bounds = result.quantities.filter(({ whyNoU }) => whyNoU === 'bound');
  return (
    <>
      <h2>By simulation</h2>
      {compared.length > 0 && <BootstrapTable compared={compared} />}
      {remarks.map(({ seen, means, remedy }) => (
        <div key={seen} className="doubt">
          <span className="doubt-mark" aria-hidden="true">
            ?
          </span>
          <p>
            <strong>{seen}</strong> {means} <em>{remedy}</em>
          </p>
        </div>
      ))}
      <p className="bootstrap-foot" role="status">
        {remarks.length === 0 && compared.length > 0 && 'The simulation bears out the intervals. '}
        {withThousands(count)} repetitions, seed {seed};{' '}
        {failed === 0 ? 'all could be fitted' : `${withThousands(failed)} could not be fitted and count for nothing`}.
        {bounds.length > 0 &&
          ` Not compared: ${bounds.map(({ label }) => label).join(', ')}, of which only one side is determined.`}
      </p>
    </>
  );
}
