import { equivalenceMarks } from './equivalenceMarks.ts';
import type { FigureRun } from './figureRun.ts';
import { formatNumber, formatSigned } from './formatNumber.ts';
import { symbolOfSystem } from './formLabel.ts';

/** What the figure shows, in sentences: for the reader, and for who cannot see it. */
export function figureCaption(run: FigureRun): string {
  if (run.points.length === 0) return 'The run holds no points.';
  return [readings(run), equivalence(run), residuals(run), apart(run), speciation(run)]
    .filter((part) => part !== '')
    .join(' ');
}

function readings(run: FigureRun): string {
  const { points, decimals, result } = run;
  const kind = result.run.readingKind;
  const excluded = points.filter((point) => !point.used).length;
  const lowest = points.reduce((a, b) => (b.reading < a.reading ? b : a)).reading;
  const highest = points.reduce((a, b) => (b.reading > a.reading ? b : a)).reading;
  const [from, to] = [points[0].volume_mL, points[points.length - 1].volume_mL];
  const range = `${formatNumber(lowest, decimals.reading)} to ${formatNumber(highest, decimals.reading)}`;
  const what = kind === 'mV' ? `Readings from ${range} mV` : `pH from ${range}`;
  const volumes = `${formatNumber(from, decimals.volume)} to ${formatNumber(to, decimals.volume)} mL of titrant`;
  const marks =
    excluded === 0
      ? `${count(points.length, 'point')} (open circles)`
      : `${count(points.length, 'point')} (open circles; the ${excluded} excluded are crosses)`;
  const line =
    result.curve === null
      ? ''
      : result.ending.code === 'predicted'
        ? ' with the predicted curve (line)'
        : ' with the fitted curve (line)';
  return `${what} over ${volumes}, ${marks}${line}.`;
}

function equivalence(run: FigureRun): string {
  const { rules, ticks } = equivalenceMarks(run);
  const sentences = [];
  if (rules.length > 0) {
    sentences.push(
      `Dotted rules: equivalence ${rules.length === 1 ? 'volume' : 'volumes'} ${listed(rules.map((mark) => mark.name))} mL.`,
    );
  }
  if (ticks.length > 0) {
    sentences.push(
      `Short ticks at the top: where the readings are steepest, ${listed(ticks.map((mark) => mark.name))} mL.`,
    );
  }
  return sentences.join(' ');
}

function residuals(run: FigureRun): string {
  const compared = run.points.filter((point) => point.used && point.residual !== null);
  if (compared.length === 0) return '';
  const values = compared.map((point) => point.residual ?? 0);
  const unit = run.result.run.readingKind === 'mV' ? ' mV' : '';
  const low = formatSigned(
    values.reduce((a, b) => Math.min(a, b)),
    run.decimals.residual,
  );
  const high = formatSigned(
    values.reduce((a, b) => Math.max(a, b)),
    run.decimals.residual,
  );
  const band = compared.some((point) => point.u !== null)
    ? '; the band is twice the standard uncertainty of each point'
    : '';
  return `Residuals lie between ${low} and ${high}${unit}${band}.`;
}

function apart({ result }: FigureRun): string {
  const used = new Set(result.points.filter((point) => point.used).map(({ line }) => line));
  const lines = result.robust?.distrusted.filter(({ line }) => used.has(line)).map(({ line }) => String(line)) ?? [];
  if (lines.length === 0) return '';
  return `Diamonds: too far from the curve for chance, ${lines.length === 1 ? 'line' : 'lines'} ${listed(lines)}.`;
}

function speciation(run: FigureRun): string {
  const { speciation } = run.result;
  if (speciation === null || run.link === null) return '';
  const systems = speciation.systems.map((system) => {
    const symbol = symbolOfSystem(speciation, system);
    const name = symbol === null ? system.name : `${system.name} (${symbol})`;
    const crossings = system.crossings.map((crossing) => formatNumber(crossing.pH, 2));
    if (crossings.length === 0) return name;
    return `${name}, whose ${system.forms.length} forms meet at pKa′ ${listed(crossings)}`;
  });
  return `On the same pH axis the shares of the forms of ${systems.join('; of ')}.`;
}

function listed(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? '' : 's'}`;
}
