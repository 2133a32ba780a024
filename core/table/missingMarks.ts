// Lower case; dashes of every length and runs of one filling character are recognised by shape below.
const WORDS: ReadonlySet<string> = new Set([
  ...['na', 'n/a', 'n.a.', 'n. a.', 'nan', '-nan', '+nan', 'nan(ind)', '-nan(ind)', 'null', 'nil', 'none', 'missing'],
  ...[
    'nd',
    'n.d.',
    'n/d',
    'k.a.',
    'k. a.',
    's.o.',
    's/o',
    'blank',
    '(blank)',
    'empty',
    'fehlt',
    'leer',
    'void',
    'invalid',
  ],
  ...[
    'inf',
    '-inf',
    '+inf',
    'infinity',
    '-infinity',
    '+infinity',
    '∞',
    '-∞',
    '1.#inf',
    '-1.#inf',
    '1.#qnan',
    '-1.#ind',
    '1.#ind',
  ],
  ...[
    'ovl',
    'ol',
    'o.l',
    'o.l.',
    '0l',
    'ovr',
    'ovrng',
    'over',
    'overrange',
    'overflow',
    'ovfl',
    'overload',
    'underrange',
  ],
  ...[
    'err',
    'error',
    '#n/a',
    '#nv',
    '#na',
    '#value!',
    '#wert!',
    '#valeur!',
    '#div/0!',
    '#ref!',
    '#num!',
    '#zahl!',
    '#null!',
    '#name?',
  ],
]);

const FILLING = /^(?:[-‐‑‒–—―−_]+|[#]+|[*]+|[+]{2,}|[?]+|[.…]+|[>]+|[<]+|[~]+|[xX]{2,})$/;

const LONGEST_MARK = 24;

/** Whether a trimmed cell says that there is no value: blank, "N/A", "NaN", dashes, overflow marks. */
export function isMissingMark(trimmed: string): boolean {
  if (trimmed === '') return true;
  if (trimmed.length > LONGEST_MARK) return false;
  return FILLING.test(trimmed) || WORDS.has(trimmed.toLowerCase());
}
