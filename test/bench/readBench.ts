import Papa from 'papaparse';
import { readRuns } from '../../core/run/readRuns.ts';
import { printTiming, timeOf } from './timeOf.ts';

/** Size of the file that is read, bytes. */
const fileSize = 5e6;

/** Reading a file of 5 MB, against splitting its cells alone. */
export function readBench(): string[] {
  const lines = ['Nr.;Volumen [mL];pH-Wert;Temperatur [°C]'];
  for (let i = 0, size = 0; size < fileSize; i++) {
    const line = `${i};${(i * 0.0001).toFixed(4)};${(3 + i * 0.00003).toFixed(4)};25,0`.replaceAll('.', ',');
    size += line.length + 1;
    lines.push(line);
  }
  const bytes = new TextEncoder().encode(lines.join('\n'));
  const whole = timeOf(
    () => {
      if (!readRuns(bytes, 'export.csv').ok) throw new Error('the file of the benchmark cannot be read');
    },
    1,
    5,
  );
  const splitting = timeOf(
    () => {
      Papa.parse(new TextDecoder().decode(bytes), { delimiter: ';' });
    },
    1,
    5,
  );
  return [
    `Reading ${(bytes.length / 1e6).toFixed(1)} MB, ${lines.length} lines`,
    `  bytes to runs                               ${printTiming(whole)}`,
    `  decoding and splitting of cells alone       ${printTiming(splitting)}`,
    `  ratio                                       ${(whole.median / splitting.median).toFixed(2)} (at most 5)`,
  ];
}
