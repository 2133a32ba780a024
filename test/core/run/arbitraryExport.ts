import fc from 'fast-check';

/** One curve and a way to write it. */
export interface WrittenExport {
  readonly bytes: Uint8Array;
  readonly points: readonly (readonly [volume_mL: number, reading: number])[];
  readonly kind: 'pH' | 'mV';
  /** Lines of points of which the reading is marked as missing. */
  readonly missing: readonly number[];
  /** The text before it was encoded, for messages. */
  readonly text: string;
}

type Encoding = 'utf-8' | 'utf-8 with mark' | 'utf-16le with mark' | 'utf-16be' | 'windows-1252';

const HEADERS = {
  pH: [
    ['V (mL)', 'pH'],
    ['Volumen [mL]', 'pH-Wert'],
    ['volume', 'pH'],
    ['Zugabe/mL', 'pH'],
    ['Vol_ml', 'pH_meas'],
  ],
  mV: [
    ['V (mL)', 'E (mV)'],
    ['Volumen [mL]', 'Spannung [mV]'],
    ['volume', 'potential'],
    ['Volume versé', 'Tension (mV)'],
  ],
} as const;

const LINES_ABOVE = [
  'Titration report',
  'Sample volume: 25.00 mL',
  'Operator: shift 2',
  '',
  'Température: 25 °C',
  '# logger 7',
];

const curve = fc
  .record({
    kind: fc.constantFrom('pH' as const, 'mV' as const),
    steps: fc.array(fc.record({ dose: fc.integer({ min: 1, max: 400 }), rise: fc.integer({ min: 0, max: 300 }) }), {
      minLength: 5,
      maxLength: 40,
    }),
    volumeDecimals: fc.integer({ min: 2, max: 4 }),
    readingDecimals: fc.integer({ min: 1, max: 3 }),
  })
  .map(({ kind, steps, volumeDecimals, readingDecimals }) => {
    let volume = 0;
    let total = 0;
    const rise = steps.reduce((sum, step) => sum + step.rise, 0) + 1;
    const cells = steps.map((step, index) => {
      if (index > 0) volume += step.dose / 100;
      total += step.rise;
      // Readings run over the range that an electrode covers in a titration, with the shape of the random steps.
      const reading = kind === 'pH' ? 2 + (10 * total) / rise : 350 - (600 * total) / rise;
      return [volume.toFixed(volumeDecimals), reading.toFixed(readingDecimals)] as const;
    });
    return { kind, cells };
  });

const LINES_BELOW = ['End of titration', '# checked', 'Remarks: none', ''];

const MISSING = ['', 'N/A', 'NaN', '-', '—', '####', 'OVL', 'n.d.'];

const MINUS = ['-', '\u2013', '\u2212', '\u2010'];

type Layout = 'plain' | 'units in a row' | 'units in cells' | 'quoted' | 'exponents' | 'thousands';

/** Names without units, for a row of units under them or units behind the figures. */
const BARE = { pH: ['Volume', 'pH'], mV: ['Volume', 'Potential'] } as const;
const UNITS = { pH: ['mL', '-'], mV: ['mL', 'mV'] } as const;
const UNITS_IN_CELLS = { pH: [' mL', ''], mV: [' mL', ' mV'] } as const;

/** Exports in every dialect that can be told apart; decimal commas are quoted where commas part the cells. */
export const arbitraryExport: fc.Arbitrary<WrittenExport> = fc
  .record({
    curve,
    delimiter: fc.constantFrom(',', ';', '\t', '|', '   '),
    decimal: fc.constantFrom('.', ','),
    lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
    header: fc.option(fc.nat(3)),
    layout: fc.constantFrom<Layout[]>(
      'plain',
      'plain',
      'units in a row',
      'units in cells',
      'quoted',
      'exponents',
      'thousands',
    ),
    above: fc.array(fc.constantFrom(...LINES_ABOVE), { maxLength: 4 }),
    below: fc.array(fc.constantFrom(...LINES_BELOW), { maxLength: 2 }),
    minus: fc.constantFrom(...MINUS),
    blanks: fc.integer({ min: 1, max: 6 }),
    missing: fc.array(fc.record({ at: fc.nat(39), mark: fc.constantFrom(...MISSING) }), { maxLength: 2 }),
    lastEmpty: fc.boolean(),
    endOfFile: fc.boolean(),
    encoding: fc.constantFrom<Encoding[]>('utf-8', 'utf-8 with mark', 'utf-16le with mark', 'utf-16be', 'windows-1252'),
  })
  .map((dialect) => {
    const { curve, decimal, lineEnd, above, below, encoding } = dialect;
    const { kind } = curve;
    const delimiter = dialect.delimiter === '   ' ? ' '.repeat(dialect.blanks) : dialect.delimiter;
    const atBlanks = dialect.delimiter === '   ';
    // Windows-1252 has one of the four, the en dash; the hyphen-minus is everywhere.
    const minus = encoding === 'windows-1252' && dialect.minus !== '-' ? '\u2013' : dialect.minus;
    // Between blanks a unit would be a cell of its own, and so would be a name of two words.
    const layout = atBlanks && dialect.layout !== 'exponents' ? 'plain' : dialect.layout;
    const needsQuotes = delimiter === ',' && (decimal === ',' || layout === 'thousands');
    const quote = needsQuotes || layout === 'quoted' ? '"' : '';
    const end = dialect.lastEmpty && !atBlanks ? delimiter : '';
    const names = namesOf(kind, dialect.header, layout);
    const unitsInCells = layout === 'units in cells' ? UNITS_IN_CELLS[kind] : ['', ''];
    const marks = new Map(dialect.missing.map(({ at, mark }) => [at, mark]));
    // A blank between blanks is no cell; the first and the last rows must be seen to be rows; five points make a run.
    const isMissing = (at: number) =>
      !atBlanks && at > 0 && at < curve.cells.length - 1 && curve.cells.length > 6 && marks.has(at);
    const write = (cell: string, unit: string) => {
      const number = layout === 'exponents' ? Number(cell).toExponential(8).replace('e', 'E') : cell;
      const [whole, fraction] = number.split('.');
      const grouped =
        layout === 'thousands' ? whole.replace(/(\d)(?=(?:\d{3})+$)/g, decimal === '.' ? '$1,' : '$1.') : whole;
      const text = fraction === undefined ? grouped : `${grouped}${decimal}${fraction}`;
      return `${quote}${text.replaceAll('-', minus)}${unit}${quote}`;
    };
    // Thousands need volumes that have them.
    const unitName = layout === 'thousands' ? 'V (µL)' : undefined;
    const cells = curve.cells.map(([volume, reading]) => {
      return [unitName === undefined ? volume : (1000 * Number(volume)).toFixed(1), reading] as const;
    });
    const rows = cells.map(([volume, reading], at) => {
      const second = isMissing(at) ? (marks.get(at) ?? '') : write(reading, unitsInCells[1]);
      return [write(volume, unitsInCells[0]), second].join(delimiter) + end;
    });
    const head = unitName === undefined ? names : [[unitName, kind === 'pH' ? 'pH' : 'E (mV)']];
    const headLines = head.map((line) => line.join(delimiter) + end);
    const lines = [...above, ...headLines, ...rows, ...below];
    const text = lines.join(lineEnd) + (dialect.endOfFile ? lineEnd : '');
    const firstRow = above.length + headLines.length + 1;
    return {
      bytes: encode(text, encoding),
      points: cells.flatMap(([volume, reading], at) => {
        if (isMissing(at)) return [];
        const volume_mL = unitName === undefined ? Number(volume) : Number(volume) / 1000;
        return [[volume_mL, Number(reading) + 0] as const];
      }),
      kind,
      missing: cells.flatMap((_, at) => (isMissing(at) ? [firstRow + at] : [])),
      text,
    };
  });

function namesOf(kind: 'pH' | 'mV', header: number | null, layout: Layout): readonly (readonly string[])[] {
  if (layout === 'units in a row') return [BARE[kind], UNITS[kind]];
  if (layout === 'units in cells') return [BARE[kind]];
  return header === null ? [] : [HEADERS[kind][header]];
}

function encode(text: string, encoding: Encoding): Uint8Array {
  if (encoding === 'utf-8') return new TextEncoder().encode(text);
  if (encoding === 'utf-8 with mark') return new TextEncoder().encode(`\ufeff${text}`);
  if (encoding === 'windows-1252') {
    return Uint8Array.from(text, (character) =>
      character === '\u2013' ? 0x96 : character === '\u2014' ? 0x97 : character.charCodeAt(0),
    );
  }
  const marked = encoding === 'utf-16le with mark' ? `\ufeff${text}` : text;
  const view = new DataView(new ArrayBuffer(2 * marked.length));
  for (let at = 0; at < marked.length; at++) view.setUint16(2 * at, marked.charCodeAt(at), encoding !== 'utf-16be');
  return new Uint8Array(view.buffer);
}
