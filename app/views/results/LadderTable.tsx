import type { LadderResult } from '../../../core/index.ts';
import { formatDecimals } from '../../widgets/formatQuantity.ts';
import { everyRungHasCarbonate, kindWords, rungKind } from './rungLook.ts';

/** Rungs so far from the best differ in nothing that matters. */
const mostDifference = 1000;
/** Less evidence than this is no evidence. */
const leastWeight = 0.001;

/** Every rung in figures, with what speaks against it. */
export function LadderTable({ ladder }: { readonly ladder: LadderResult }) {
  const { rungs, chosen } = ladder;
  const isAsked = everyRungHasCarbonate(rungs);
  const criteria = rungs.flatMap(({ aicc }) => (aicc === null ? [] : [aicc]));
  const best = criteria.length === 0 ? 0 : Math.min(...criteria);
  return (
    <table className="rungs">
      <caption className="unseen">The run with other numbers of groups</caption>
      <thead>
        <tr>
          <th scope="col">groups</th>
          <th scope="col" className="number" title="Number of fitted quantities">
            fitted
          </th>
          <th
            scope="col"
            className="number"
            title="Root mean square of the residuals in units of their noise; 1 is noise alone"
          >
            residual
          </th>
          <th scope="col" className="number" title="Corrected information criterion above the least of all">
            ΔAICc
          </th>
          <th scope="col" className="number" title="Share of the evidence">
            weight
          </th>
        </tr>
      </thead>
      <tbody>
        {rungs.map((rung, index) => {
          const { groups, parameters, weightedResidual, aicc, weight, pKa, againstIt, test } = rung;
          const kind = rungKind(rung, isAsked);
          const constants = pKa.flatMap((value) => (value === null ? [] : [formatDecimals(value, 2)]));
          const remarks = [
            ...(constants.length === 0 ? [] : [`pKa ${constants.join(', ')}`]),
            ...(test === null ? [] : [`F ${threeDigits(test.F)}, p ${pWords(test.p)}`]),
            ...againstIt,
          ];
          return [
            <tr key={`${groups} ${kind}`} className={index === chosen ? 'chosen' : undefined}>
              <th scope="row">
                {groups}
                {kind === 'plain' ? '' : ` ${kindWords[kind]}`}
                {index === chosen && <small> shown by this run</small>}
              </th>
              <td className="number">{parameters}</td>
              {weightedResidual === null || aicc === null ? (
                <td colSpan={3} className="why">
                  could not be fitted
                </td>
              ) : (
                <>
                  <td className="number">{threeDigits(weightedResidual)}</td>
                  <td className="number">
                    {aicc - best > mostDifference ? `> ${mostDifference}` : formatDecimals(aicc - best, 1)}
                  </td>
                  <td className="number">{weight < leastWeight ? `< ${leastWeight}` : formatDecimals(weight, 3)}</td>
                </>
              )}
            </tr>,
            remarks.length > 0 && (
              <tr key={`${groups} ${kind} remark`} className="remark-row">
                <td colSpan={5}>{remarks.join('; ')}</td>
              </tr>
            ),
          ];
        })}
      </tbody>
    </table>
  );
}

function threeDigits(value: number): string {
  if (value >= 1e6) return '> 10⁶';
  const decimals = value >= 100 ? 0 : value >= 10 ? 1 : value >= 1 ? 2 : 3;
  return formatDecimals(value, decimals);
}

function pWords(p: number): string {
  return p < 0.001 ? '< 0.001' : formatDecimals(p, 3);
}
