import type { PotentialUnit } from './potential.ts';
import type { VolumeUnit } from './volume.ts';

/** Units that exports print in a header, in a row under it or behind a number. */
export type ExportUnit = VolumeUnit | PotentialUnit | 'pH' | '°C' | 'K' | 's' | 'min' | 'h' | '%' | 'mV/min' | 'mL/min';

// Case matters only where it changes the meaning; the keys are tried as written, then in lower case.
const SPELLINGS: ReadonlyMap<string, ExportUnit> = new Map<string, ExportUnit>([
  ['ml', 'mL'],
  ['cm3', 'mL'],
  ['cm³', 'mL'],
  ['cm^3', 'mL'],
  ['ccm', 'mL'],
  ['cc', 'mL'],
  ['milliliter', 'mL'],
  ['millilitre', 'mL'],
  ['milliliters', 'mL'],
  ['millilitres', 'mL'],
  ['µl', 'µL'],
  ['ul', 'µL'],
  ['mm3', 'µL'],
  ['mm³', 'µL'],
  ['microliter', 'µL'],
  ['microlitre', 'µL'],
  ['mikroliter', 'µL'],
  ['l', 'L'],
  ['dm3', 'L'],
  ['dm³', 'L'],
  ['liter', 'L'],
  ['litre', 'L'],
  ['liters', 'L'],
  ['litres', 'L'],
  ['mv', 'mV'],
  ['millivolt', 'mV'],
  ['millivolts', 'mV'],
  ['v', 'V'],
  ['volt', 'V'],
  ['volts', 'V'],
  ['ph', 'pH'],
  ['°c', '°C'],
  ['ºc', '°C'],
  ['degc', '°C'],
  ['deg c', '°C'],
  ['℃', '°C'],
  ['celsius', '°C'],
  ['kelvin', 'K'],
  ['s', 's'],
  ['sec', 's'],
  ['sek', 's'],
  ['seconds', 's'],
  ['min', 'min'],
  ['minutes', 'min'],
  ['h', 'h'],
  ['%', '%'],
  ['mv/min', 'mV/min'],
  ['ml/min', 'mL/min'],
]);

const LONGEST_SPELLING = 12;

/**
 * The unit that a piece of text names, with or without brackets around it:
 * "mL", "[µl]", "(°C)". Undefined where the text is no unit known here.
 */
export function readUnit(text: string): ExportUnit | undefined {
  if (text.length > LONGEST_SPELLING + 4) return undefined;
  // The micro sign and the Greek letter look alike and both occur.
  const bare = text
    .replace(/^[\s([{<]+|[\s)\]}>.]+$/g, '')
    .replace(/\u03bc/g, 'µ')
    .toLowerCase();
  return SPELLINGS.get(bare);
}
