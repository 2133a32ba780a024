/** A piece of a chemical or mathematical label on its line, below it or above it. */
export interface TextPart {
  readonly text: string;
  readonly at: 'line' | 'sub' | 'sup';
}

/** A label with sub- and superscripts, free of any markup. */
export type RichText = readonly TextPart[];

const UNICODE = {
  sub: { '0': '₀', '1': '₁', '2': '₂', '3': '₃', '4': '₄', '5': '₅', '6': '₆', '7': '₇', '8': '₈', '9': '₉', a: 'ₐ' },
  sup: {
    '0': '⁰',
    '1': '¹',
    '2': '²',
    '3': '³',
    '4': '⁴',
    '5': '⁵',
    '6': '⁶',
    '7': '⁷',
    '8': '⁸',
    '9': '⁹',
    '+': '⁺',
    '−': '⁻',
  },
} as const;

/** For plain text, such as captions: `H₃X²⁺`. */
export function toUnicode(label: RichText): string {
  return label
    .map(({ text, at }) => {
      if (at === 'line') return text;
      const table: Readonly<Record<string, string>> = UNICODE[at];
      return [...text].map((character) => table[character] ?? character).join('');
    })
    .join('');
}

/** For the plotting library, which understands a few tags: `H<sub>3</sub>X<sup>2+</sup>`. */
export function toMarkup(label: RichText): string {
  return label.map(({ text, at }) => (at === 'line' ? escapeMarkup(text) : `<${at}>${text}</${at}>`)).join('');
}

/** A name that a person typed may hold characters that the plotting library would take for tags. */
export function escapeMarkup(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
