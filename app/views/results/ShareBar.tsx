import { Fragment } from 'react';
import type { SharePart } from './shareParts.ts';

const width = 66;
const height = 9;
const swatch = 9;

/** Where the variance of a result comes from: a stacked bar, and the same in words in the same order. */
export function ShareBar({ parts }: { readonly parts: readonly SharePart[] }) {
  const total = parts.reduce((sum, { percent }) => sum + percent, 0);
  let from = 0;
  return (
    <span className="shares">
      <span>variance</span>{' '}
      <svg className="share-bar" width={width} height={height} aria-hidden="true">
        {parts.map(({ name, percent, look }) => {
          const x = (from / total) * (width - 1) + 0.5;
          from += percent;
          return <Look key={name} look={look} x={x} width={(percent / total) * (width - 1)} />;
        })}
      </svg>{' '}
      {parts.map(({ name, percent, look }, i) => (
        <Fragment key={name}>
          <span className="share-part">
            <svg width={swatch} height={swatch} aria-hidden="true">
              <Look look={look} x={0.5} width={swatch - 1} />
            </svg>{' '}
            {percent}&nbsp;% {name}
            {i < parts.length - 1 ? ',' : ''}
          </span>{' '}
        </Fragment>
      ))}
    </span>
  );
}

function Look({ look, x, width: wide }: { readonly look: number | null; readonly x: number; readonly width: number }) {
  const fill = look === null ? 'none' : look === 0 ? 'currentColor' : `url(#share-look-${look})`;
  return <rect className="share-look" x={x} y={0.5} width={wide} height={height - 1} fill={fill} />;
}
