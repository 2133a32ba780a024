import type { SpeciationResult } from '../../core/index.ts';
import type { RichText, TextPart } from './richText.ts';

type System = SpeciationResult['systems'][number];

/** Stand for a substance without its protons; none is the symbol of an element that analysts meet. */
const SYMBOLS = ['X', 'Y', 'Z', 'Q', 'L', 'J'];

const CARBONIC: readonly RichText[] = [
  [line('CO'), sub('2')],
  [line('HCO'), sub('3'), sup('−')],
  [line('CO'), sub('3'), sup('2−')],
];

/** A name that says carbonate and nothing else has the forms of carbonic acid. */
const CARBONATE_NAME = /^((di)?(sodium|potassium) )?(hydrogen ?|bi)?carbonate$/i;

/** Letter of the system among its run's, in the order of the result; null for carbonate, whose forms have formulas. */
export function symbolOfSystem(speciation: SpeciationResult, system: System): string | null {
  if (isCarbonic(system)) return null;
  const place = speciation.systems.filter((other) => !isCarbonic(other)).indexOf(system);
  return SYMBOLS[place] ?? `X${place + 1}`;
}

/** Formula of one form: `H₃X²⁺`, `HX`, `X⁻`, or that of carbonic acid. */
export function formLabel(speciation: SpeciationResult, system: System, form: number): RichText {
  const symbol = symbolOfSystem(speciation, system);
  if (symbol === null) return CARBONIC[form];
  const { protons, charge } = system.forms[form];
  const parts: TextPart[] = [];
  if (protons > 0) parts.push(line('H'));
  if (protons > 1) parts.push(sub(String(protons)));
  parts.push(line(symbol));
  if (charge !== 0) {
    const size = Math.abs(charge) === 1 ? '' : String(Math.abs(charge));
    parts.push(sup(`${size}${charge > 0 ? '+' : '−'}`));
  }
  return parts;
}

function isCarbonic(system: System): boolean {
  const shape = system.forms.length === 3 && system.forms[0].charge === 0;
  return shape && (system.role === 'carbonate' || CARBONATE_NAME.test(system.name.trim()));
}

function line(text: string): TextPart {
  return { text, at: 'line' };
}

function sub(text: string): TextPart {
  return { text, at: 'sub' };
}

function sup(text: string): TextPart {
  return { text, at: 'sup' };
}
