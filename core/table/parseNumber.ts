import { readUnit } from '../units/readUnit.ts';
import { isMissingMark } from './missingMarks.ts';
import type { NumberMarks } from './numberMarks.ts';

/** A finite number, a mark for "no value", or anything else. */
export type CellValue = number | 'missing' | 'text';

const ZERO = 0x30;
const NINE = 0x39;
const POINT = 0x2e;
const COMMA = 0x2c;
const PLUS = 0x2b;
const MINUS = 0x2d;

/** Integers of so many digits, and powers of ten up to 10^22, are exact in a double. */
const EXACT_DIGITS = 15;
const POWERS_OF_TEN = Float64Array.from({ length: EXACT_DIGITS + 1 }, (_, power) => 10 ** power);

/**
 * Reads one cell strictly: the whole cell is one number in the given marks,
 * with an optional known unit behind it ("12.50 mL"), or it is no number.
 * Nothing is repaired: "12,5" with a decimal point is text, and so is a number
 * too large or too small for a double.
 */
export function parseNumber(cell: string, marks: NumberMarks): CellValue {
  let end = cell.length;
  let start = 0;
  while (start < end && isBlank(cell.charCodeAt(start))) start += 1;
  while (end > start && isBlank(cell.charCodeAt(end - 1))) end -= 1;
  if (start === end) return 'missing';

  const plain = plainNumber(cell, start, end, marks.decimal === '.' ? POINT : COMMA);
  if (!Number.isNaN(plain)) return plain;
  const numberEnd = scanNumber(cell, start, end, marks);
  if (numberEnd > start && (numberEnd === end || readUnit(cell.slice(numberEnd, end)) !== undefined)) {
    return toNumber(cell.slice(start, numberEnd), marks);
  }
  return isMissingMark(cell.slice(start, end)) ? 'missing' : 'text';
}

/**
 * The fast way for what nearly every cell holds: a sign, a few digits, a decimal
 * mark, a few digits. The quotient of two exact numbers is rounded once, so the
 * value is the one that any correct reader gives. NaN for everything else.
 */
function plainNumber(cell: string, start: number, end: number, decimal: number): number {
  const sign = cell.charCodeAt(start);
  const first = sign === MINUS || sign === PLUS ? start + 1 : start;
  if (end - first > EXACT_DIGITS + 1) return Number.NaN;
  let mantissa = 0;
  let mark = -1;
  for (let at = first; at < end; at++) {
    const code = cell.charCodeAt(at);
    if (code >= ZERO && code <= NINE) mantissa = mantissa * 10 + code - ZERO;
    else if (code === decimal && mark < 0) mark = at;
    else return Number.NaN;
  }
  const decimals = mark < 0 ? 0 : end - mark - 1;
  const digits = end - first - (mark < 0 ? 0 : 1);
  if (digits === 0 || digits > EXACT_DIGITS || (mark >= 0 && decimals === 0 && decimal === COMMA)) return Number.NaN;
  const value = mantissa / POWERS_OF_TEN[decimals];
  return sign === MINUS ? 0 - value : value;
}

/** The end of the number that begins at `start`, or `start` where none does. */
function scanNumber(cell: string, start: number, end: number, marks: NumberMarks): number {
  let at = start;
  if (isSign(cell.charCodeAt(at))) at += 1;
  const firstDigit = at;
  at = skipDigits(cell, at, end);
  let digits = at - firstDigit;
  // A leading zero never stands before a grouping mark: "0,123" is a decimal fraction.
  if (marks.thousands !== '' && digits >= 1 && digits <= 3 && cell.charCodeAt(firstDigit) !== ZERO) {
    while (isThousands(cell.charCodeAt(at), marks.thousands) && skipDigits(cell, at + 1, end) === at + 4) at += 4;
  }
  if (at < end && cell[at] === marks.decimal) {
    const fraction = skipDigits(cell, at + 1, end);
    const fractionDigits = fraction - at - 1;
    // "5." is a number to many programs; "5," is far more often a list.
    if (fractionDigits > 0 || (digits > 0 && marks.decimal === '.')) {
      digits += fractionDigits;
      at = fraction;
    }
  }
  if (digits === 0) return start;
  const mark = at < end ? cell.charCodeAt(at) : 0;
  if (mark === 0x65 || mark === 0x45) {
    const sign = at + 1 < end && isSign(cell.charCodeAt(at + 1)) ? 1 : 0;
    const exponent = skipDigits(cell, at + 1 + sign, end);
    if (exponent > at + 1 + sign) at = exponent;
  }
  return at;
}

function toNumber(text: string, marks: NumberMarks): CellValue {
  let plain = text.replace(/[‐‑‒–—−﹣-]/g, '-').replace('＋', '+');
  if (marks.thousands === ' ') plain = plain.replace(/[ \u00a0\u2009\u202f]/g, '');
  else if (marks.thousands === "'") plain = plain.replace(/['’]/g, '');
  else if (marks.thousands !== '') plain = plain.replaceAll(marks.thousands, '');
  const value = Number(plain.replace(',', '.'));
  if (!Number.isFinite(value)) return 'text';
  if (value === 0) return /^[^eE]*[1-9]/.test(text) ? 'text' : 0;
  return value;
}

function skipDigits(cell: string, from: number, end: number): number {
  let at = from;
  while (at < end) {
    const code = cell.charCodeAt(at);
    if (code < ZERO || code > NINE) break;
    at += 1;
  }
  return at;
}

/** Plus, the hyphen-minus and the dashes that typography and word processors put in its place. */
function isSign(code: number): boolean {
  if (code === 0x2d || code === 0x2b) return true;
  return code === 0x2212 || (code >= 0x2010 && code <= 0x2014) || code === 0xfe63 || code === 0xff0d || code === 0xff0b;
}

function isThousands(code: number, mark: NumberMarks['thousands']): boolean {
  if (mark === ' ') return code === 0x20 || code === 0xa0 || code === 0x2009 || code === 0x202f;
  if (mark === "'") return code === 0x27 || code === 0x2019;
  return code === mark.charCodeAt(0);
}

function isBlank(code: number): boolean {
  return code === 0x20 || (code >= 0x09 && code <= 0x0d) || code === 0xa0 || code === 0x2009 || code === 0x202f;
}
