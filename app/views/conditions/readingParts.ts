import type { Sheet, SheetFile } from '../../../core/index.ts';
import { formatDeclared } from '../../widgets/formatQuantity.ts';
import { choiceField, numberField, quantityField } from './fields.ts';
import type { SentencePart } from './sentence.ts';

const pHScales = {
  activity: { label: 'pH on the activity scale', detail: 'The meter was calibrated with buffers.' },
  concentration: {
    label: 'p[H⁺] on the concentration scale',
    detail: 'The electrode was calibrated by a strong-acid titration.',
  },
};

const potentialScales = {
  activity: { label: 'millivolts answering to activity', detail: 'The electrode was calibrated with buffers.' },
  concentration: {
    label: 'millivolts answering to concentration',
    detail: 'The electrode was calibrated by a strong-acid titration.',
  },
};

const activities = {
  davies: { label: 'by Davies', detail: 'Constants are those at infinite dilution; holds up to about 0.5 M.' },
  none: { label: 'taken as one', detail: 'Constants are those of this medium.' },
};

/** "at 25.0 °C, read as pH on the activity scale, electrode offset 0, u = 0.02; activity coefficients by Davies". */
export function readingParts(file: SheetFile, sheet: Sheet): SentencePart[] {
  const { reading, medium } = sheet;
  const degrees = medium.temperature;
  const inPH = reading.kind === 'pH';
  return [
    ', at ',
    numberField(
      { id: 'medium.temperature', label: 'temperature', path: ['medium', 'temperature_C'] },
      degrees,
      `${formatDeclared(degrees.value, 1)}\u00a0°C`,
      '°C',
    ),
    ', read as ',
    choiceField(
      { id: 'reading.scale', label: 'scale of the readings', path: ['reading', 'scale'] },
      reading.scale,
      inPH ? pHScales : potentialScales,
    ),
    inPH ? ', electrode offset ' : ', standard potential ',
    inPH
      ? quantityField(
          file,
          {
            id: 'reading.offset',
            label: 'electrode offset at pH 7',
            path: ['reading', 'offset'],
            hint: 'A meter is no better than its buffers, and a pKa cannot be either.',
          },
          reading.offset,
          { unit: '', decimals: 0 },
        )
      : quantityField(
          file,
          { id: 'reading.E0', label: 'standard potential', path: ['reading', 'E0_mV'] },
          reading.standardPotential,
          { unit: 'mV', decimals: 1 },
        ),
    '; activity coefficients ',
    choiceField(
      { id: 'medium.activity', label: 'activity coefficients', path: ['medium', 'activity'] },
      medium.activity,
      activities,
    ),
    medium.solvent === 'water' ? ', pKw ' : ', autoprotolysis constant ',
    quantityField(
      file,
      {
        id: 'medium.pKw',
        label: medium.solvent === 'water' ? 'ion product of water, pKw' : 'autoprotolysis constant',
        path: ['medium', 'pKw'],
      },
      medium.pKw.state === 'fixed' ? { ...medium.pKw, value: Number(medium.pKw.value.toFixed(4)) } : medium.pKw,
      { unit: '', decimals: 2 },
    ),
    '.',
  ];
}
