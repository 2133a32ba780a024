import fc from 'fast-check';

/** One curve and a way to write it. */
export interface WrittenExport {
  readonly bytes: Uint8Array;
  readonly points: readonly (readonly [volume_mL: number, reading: number])[];
  readonly kind: 'pH' | 'mV';
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

/** Exports in every dialect that can be told apart; decimal commas are quoted where commas part the cells. */
export const arbitraryExport: fc.Arbitrary<WrittenExport> = fc
  .record({
    curve,
    delimiter: fc.constantFrom(',', ';', '\t', '|', '   '),
    decimal: fc.constantFrom('.', ','),
    lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
    header: fc.option(fc.nat(3)),
    above: fc.array(fc.constantFrom(...LINES_ABOVE), { maxLength: 4 }),
    minus: fc.constantFrom('-', '\u2013'),
    lastEmpty: fc.boolean(),
    endOfFile: fc.boolean(),
    encoding: fc.constantFrom<Encoding[]>('utf-8', 'utf-8 with mark', 'utf-16le with mark', 'utf-16be', 'windows-1252'),
  })
  .map(({ curve, delimiter, decimal, lineEnd, header, above, minus, lastEmpty, endOfFile, encoding }) => {
    const quote = delimiter === ',' && decimal === ',' ? '"' : '';
    const end = lastEmpty && delimiter !== '   ' ? delimiter : '';
    const write = (cell: string) => quote + cell.replace('.', decimal).replace('-', minus) + quote;
    const rows = curve.cells.map((cells) => cells.map(write).join(delimiter) + end);
    const names = header === null ? [] : [HEADERS[curve.kind][header].join(delimiter) + end];
    const text = [...above, ...names, ...rows].join(lineEnd) + (endOfFile ? lineEnd : '');
    return {
      bytes: encode(text, encoding),
      points: curve.cells.map(([volume, reading]) => [Number(volume), Number(reading) + 0] as const),
      kind: curve.kind,
      text,
    };
  });

function encode(text: string, encoding: Encoding): Uint8Array {
  if (encoding === 'utf-8') return new TextEncoder().encode(text);
  if (encoding === 'utf-8 with mark') return new TextEncoder().encode(`\ufeff${text}`);
  if (encoding === 'windows-1252') {
    return Uint8Array.from(text, (character) => (character === '\u2013' ? 0x96 : character.charCodeAt(0)));
  }
  const marked = encoding === 'utf-16le with mark' ? `\ufeff${text}` : text;
  const view = new DataView(new ArrayBuffer(2 * marked.length));
  for (let at = 0; at < marked.length; at++) view.setUint16(2 * at, marked.charCodeAt(at), encoding !== 'utf-16be');
  return new Uint8Array(view.buffer);
}
