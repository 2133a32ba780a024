import type { RichText } from './richText.ts';

/** Sub- and superscripts are drawn at this share of the size of their line. */
const SCRIPT_SIZE = 0.7;
/** The page's families differ by about this much; a label must not touch its neighbour in any of them. */
const ALLOWANCE = 1.08;

/**
 * Width of a label in px, estimated from common widths of serif type, on the
 * large side. An estimate is enough, because labels are anchored at the side
 * that matters, and it keeps the layout the same on every machine.
 */
export function textWidth(label: RichText | string, size: number): number {
  if (typeof label === 'string') return ALLOWANCE * size * lineWidth(label);
  return label.reduce(
    (sum, part) => sum + ALLOWANCE * size * (part.at === 'line' ? 1 : SCRIPT_SIZE) * lineWidth(part.text),
    0,
  );
}

function lineWidth(text: string): number {
  let width = 0;
  for (const character of text) {
    if (/[ .,:;′'|il]/.test(character)) width += 0.28;
    else if (/[A-Zmw%]/.test(character)) width += 0.76;
    else if (/[+−±=]/.test(character)) width += 0.6;
    else width += 0.52;
  }
  return width;
}
