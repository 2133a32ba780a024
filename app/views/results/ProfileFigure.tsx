import { useId } from 'react';
import type { QuantityResult } from '../../../core/index.ts';
import type { ProfileCurve, ProfilePlace } from '../../figures/profileCurve.ts';
import { formatDecimals, formatQuantity } from '../../widgets/formatQuantity.ts';
import { profileWords } from './profileWords.ts';

interface Props {
  readonly quantity: QuantityResult;
  readonly profile: ProfileCurve;
}

const width = 420;
const height = 178;
const left = 34;
const right = 8;
const top = 10;
const bottom = 34;

/** How fast the fit gets worse as a quantity is moved off its value, with the interval that follows from it. */
export function ProfileFigure({ quantity, profile }: Props) {
  const clip = useId();
  const { values, highest, threshold, refits, curve, parabola } = profile;
  const { value, u, interval95, unit, label } = quantity;
  const x = (at: number) => left + ((at - values[0]) / (values[1] - values[0])) * (width - left - right);
  const y = (rise: number) => height - bottom - (rise / highest) * (height - top - bottom);
  const path = (places: readonly ProfilePlace[]) =>
    places.map(([at, rise], i) => `${i === 0 ? 'M' : 'L'}${x(at).toFixed(1)} ${y(rise).toFixed(1)}`).join('');
  const ground = y(0);
  const digits = (at: number) => formatQuantity(at, u, 4).value;
  const [low, high] = interval95 ?? [null, null];
  const ticks = [low, value, high].filter((at) => at !== null).filter((at) => at >= values[0] && at <= values[1]);
  return (
    <figure className="drawing profile">
      <svg viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
        <clipPath id={clip}>
          <rect x={left} y={top} width={width - left - right} height={ground - top + 1} />
        </clipPath>
        <line className="axis" x1={left} x2={width - right} y1={ground} y2={ground} />
        {[low, high].map(
          (end) =>
            end !== null &&
            threshold !== null && (
              <line key={end} className="profile-end" x1={x(end)} x2={x(end)} y1={y(threshold)} y2={ground} />
            ),
        )}
        {threshold !== null && (
          <>
            <line className="profile-threshold" x1={left} x2={width - right} y1={y(threshold)} y2={y(threshold)} />
            <text x={left - 5} y={y(threshold) + 4} textAnchor="end">
              {formatDecimals(threshold, 2)}
            </text>
            <text x={(left + width - right) / 2} y={y(threshold) - 5} textAnchor="middle" className="quiet-text">
              95 %
            </text>
          </>
        )}
        <text x={left - 5} y={ground + 4} textAnchor="end">
          0
        </text>
        <g clipPath={`url(#${clip})`}>
          <path className="profile-parabola" d={path(parabola)} />
          <path className="profile-curve" d={path(curve)} />
          {refits.map(([at, rise]) => (
            <circle key={at} cx={x(at)} cy={y(rise)} r={3} />
          ))}
        </g>
        {ticks.map((at) => (
          <g key={at}>
            <line className="axis" x1={x(at)} x2={x(at)} y1={ground} y2={ground + 4} />
            <text x={x(at)} y={ground + 17} textAnchor="middle">
              {digits(at)}
            </text>
          </g>
        ))}
        <text x={(left + width - right) / 2} y={height - 3} textAnchor="middle" className="quiet-text">
          {label}
          {unit === '' ? '' : ` / ${unit}`}
        </text>
      </svg>
      <figcaption>{profileWords(quantity, profile)}</figcaption>
    </figure>
  );
}
