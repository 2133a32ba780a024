import type { Declaration, QuantityFile } from '../../../core/index.ts';
import { formatDeclared } from '../../widgets/formatQuantity.ts';

/** How a quantity is put into words. */
export interface QuantityWords {
  readonly unit: string;
  /** At least so many are written. */
  readonly decimals: number;
  /** What is said of nothing: "no carbonate". */
  readonly whenZero?: string;
  /** What there is so much of: "carbonate". */
  readonly noun?: string;
  /** Stands behind the number: "× the ideal". */
  readonly behind?: string;
}

/** A declared quantity in the words of a method section: "0.1002 M (u = 0.0002 M)". */
export function declarationWords(
  declaration: Declaration,
  written: QuantityFile | undefined,
  words: QuantityWords,
): string {
  const tail = words.noun ?? words.behind;
  const behind = tail === undefined ? '' : ` ${tail}`;
  if (declaration.state === 'fitted') {
    const start = declaration.start === null ? '' : `, starting at ${withUnit(declaration.start, 0, words.unit)}`;
    return `${words.noun === undefined ? '' : `${words.noun} `}to be fitted${start}`;
  }
  if (declaration.state === 'fixed') {
    if (declaration.value === 0 && words.whenZero !== undefined) return words.whenZero;
    return `${withUnit(declaration.value, words.decimals, words.unit)}${behind}`;
  }
  const value = withUnit(declaration.value, words.decimals, words.unit);
  return `${value} (${uncertaintyWords(declaration, written, words.unit)})${behind}`;
}

function uncertaintyWords(
  declaration: Extract<Declaration, { state: 'known' }>,
  written: QuantityFile | undefined,
  unit: string,
): string {
  if (typeof written === 'object' && 'U' in written)
    return `U\u00a0=\u00a0${withUnit(written.U, 0, unit)}, k\u00a0=\u00a0${written.k}`;
  if (typeof written === 'object' && 'tolerance' in written)
    return `tolerance ±${withUnit(written.tolerance, 0, unit)}, ${written.distribution}`;
  return `u\u00a0=\u00a0${withUnit(declaration.u, 0, unit)}`;
}

function withUnit(value: number, decimals: number, unit: string): string {
  // A no-break space keeps number and unit on one line.
  return `${formatDeclared(value, decimals)}${unit === '' ? '' : `\u00a0${unit}`}`;
}
