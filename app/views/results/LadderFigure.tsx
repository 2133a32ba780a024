import { Fragment } from 'react';
import type { LadderResult } from '../../../core/index.ts';
import { RungMark } from './RungMark.tsx';
import { everyRungHasCarbonate, kindWords, type RungKind, rungKind } from './rungLook.ts';

const width = 420;
const height = 196;
const left = 46;
const right = 10;
const top = 10;
const bottom = 40;
/** Rungs of equally many groups stand this far apart, px. */
const apart = 14;
const kinds: readonly RungKind[] = ['plain', 'carbonate', 'excess', 'both'];

/** What is left of the readings after each number of groups, in units of their noise: a fit that explains them lies at 1. */
export function LadderFigure({ ladder }: { readonly ladder: LadderResult }) {
  const { rungs, chosen } = ladder;
  const isAsked = everyRungHasCarbonate(rungs);
  const drawn = rungs.flatMap((rung, index) =>
    rung.weightedResidual === null || !(rung.weightedResidual > 0)
      ? []
      : [{ rung, index, residual: rung.weightedResidual, kind: rungKind(rung, isAsked) }],
  );
  if (drawn.length === 0) return null;
  const present = kinds.filter((kind) => drawn.some((entry) => entry.kind === kind));
  const most = Math.max(...rungs.map(({ groups }) => groups));
  const powers = drawn.map(({ residual }) => Math.log10(residual));
  const low = Math.floor(Math.min(0, ...powers) - 0.15);
  const high = Math.max(1, Math.ceil(Math.max(...powers)));
  const x = (groups: number, kind: RungKind) =>
    left +
    ((groups + 0.5) / (most + 1)) * (width - left - right) +
    (present.indexOf(kind) - (present.length - 1) / 2) * apart;
  const y = (power: number) => top + ((high - power) / (high - low)) * (height - top - bottom);
  const middle = (groups: number) => left + ((groups + 0.5) / (most + 1)) * (width - left - right);
  const ground = height - bottom;
  return (
    <figure className="drawing ladder-figure">
      <svg viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
        <line className="axis" x1={left} x2={left} y1={top} y2={ground} />
        <line className="ladder-noise" x1={left} x2={width - right} y1={y(0)} y2={y(0)} />
        {Array.from({ length: high - low + 1 }, (_, i) => low + i).map((power) => (
          <g key={power}>
            <line className="axis" x1={left - 4} x2={left} y1={y(power)} y2={y(power)} />
            <text x={left - 8} y={y(power) + 4} textAnchor="end">
              {power < 0 ? (10 ** power).toFixed(-power) : 10 ** power}
            </text>
          </g>
        ))}
        {Array.from({ length: most + 1 }, (_, groups) => (
          <text key={middle(groups)} x={middle(groups)} y={ground + 16} textAnchor="middle">
            {groups}
          </text>
        ))}
        <text x={(left + width - right) / 2} y={height - 5} textAnchor="middle" className="quiet-text">
          ionisable groups
        </text>
        <text x={width - right} y={y(0) - 5} textAnchor="end" className="quiet-text">
          noise
        </text>
        {drawn.map(({ rung, index, residual, kind }) => (
          <RungMark
            key={`${rung.groups} ${kind}`}
            kind={kind}
            x={x(rung.groups, kind)}
            y={y(Math.log10(residual))}
            isChosen={index === chosen}
            isDoubtful={rung.againstIt.length > 0}
          />
        ))}
      </svg>
      <figcaption>
        Mean weighted residual with each number of groups
        {present.length > 1 &&
          present.map((kind, i) => (
            <Fragment key={kind}>
              {i === 0 ? ': ' : ', '}
              <span className="rung-legend">
                <svg width="14" height="14" aria-hidden="true">
                  <RungMark kind={kind} x={7} y={7} isChosen={false} isDoubtful={false} />
                </svg>{' '}
                {kindWords[kind]}
              </span>
            </Fragment>
          ))}
        . Ringed: what the run shows. Struck through: something speaks against it.
      </figcaption>
    </figure>
  );
}
