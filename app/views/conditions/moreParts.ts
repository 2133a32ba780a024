import type { Sheet, SheetFile } from '../../../core/index.ts';
import { formatDeclared } from '../../widgets/formatQuantity.ts';
import { numberField, quantityField, textField } from './fields.ts';
import { strongIonField } from './sampleParts.ts';
import type { SentencePart } from './sentence.ts';
import { substancesField } from './substancesField.ts';

/** The conditions that are seldom anything but usual. */
export function moreParts(file: SheetFile, sheet: Sheet): SentencePart[] {
  const { sample, titrant, burette, reading, medium } = sheet;
  const hasSubstances = sample.analytes.length > 0;
  const ownUnit = reading.kind === 'mV' ? 'mV' : '';
  return [
    'The sample holds ',
    substancesField(sheet),
    ', ',
    quantityField(
      file,
      { id: 'sample.carbonate', label: 'carbonate in the sample', path: ['sample', 'carbonate_M'] },
      sample.carbonate,
      {
        unit: 'M',
        decimals: 4,
        whenZero: 'no carbonate',
        noun: 'carbonate',
      },
    ),
    ...(hasSubstances ? [' and, beyond its counter-ions, ', strongIonField(file, sheet)] : []),
    '; to cover the electrode it got ',
    quantityField(
      file,
      { id: 'sample.extraWater', label: 'water added to the sample', path: ['sample', 'extraWater_mL'] },
      sample.extraWater,
      { unit: 'mL', decimals: 1, whenZero: 'no extra water', behind: 'of water' },
    ),
    '. The titrant holds ',
    quantityField(
      file,
      { id: 'titrant.background', label: 'background electrolyte in the titrant', path: ['titrant', 'background_M'] },
      titrant.background,
      { unit: 'M', decimals: 2, whenZero: 'no background electrolyte', noun: 'background electrolyte' },
    ),
    ' and ',
    quantityField(
      file,
      {
        id: 'titrant.strongIon',
        label: 'strong acid or base beside the titrant',
        path: ['titrant', 'strongIon_M'],
        hint: 'Positive for a strong base, negative for a strong acid.',
      },
      titrant.strongIon,
      { unit: 'M', decimals: 4, whenZero: 'no other strong acid or base' },
    ),
    '. The burette delivers ',
    quantityField(
      file,
      { id: 'burette.gain', label: 'burette gain, true over shown volume', path: ['burette', 'gain'] },
      burette.gain,
      { unit: '', decimals: 0, behind: '× the volume it shows' },
    ),
    ', each volume is set with u\u00a0=\u00a0',
    numberField(
      { id: 'burette.setting', label: 'uncertainty of a set volume', path: ['burette', 'uSetting_mL'] },
      burette.settingUncertainty,
      `${formatDeclared(burette.settingUncertainty.value, 0)}\u00a0mL`,
      'mL',
    ),
    ' and each dose adds u\u00a0=\u00a0',
    numberField(
      {
        id: 'burette.dose',
        label: 'uncertainty of a dose',
        path: ['burette', 'uDose_mL'],
        hint: 'It adds up from dose to dose.',
      },
      burette.doseUncertainty,
      `${formatDeclared(burette.doseUncertainty.value, 0)}\u00a0mL`,
      'mL',
    ),
    '. The electrode’s slope is ',
    quantityField(
      file,
      { id: 'reading.slope', label: 'electrode slope, 1 being ideal', path: ['reading', 'slope'] },
      reading.slope,
      { unit: '', decimals: 0, behind: '× the ideal' },
    ),
    '; the uncertainty of one reading is ',
    numberField(
      { id: 'reading.u', label: 'standard uncertainty of a reading', path: ['reading', 'u'] },
      { value: reading.uncertainty, assumed: false },
      reading.uncertainty === null
        ? 'estimated from the run'
        : `u = ${formatDeclared(reading.uncertainty, 0)}${ownUnit === '' ? '' : `\u00a0${ownUnit}`}`,
      ownUnit,
      'estimated from the run',
    ),
    '; liquid junction: ',
    quantityField(
      file,
      { id: 'reading.junctionHydrogen', label: 'junction term of H⁺', path: ['reading', 'junctionHydrogen'] },
      reading.junctionHydrogen,
      { unit: 'L/mol', decimals: 0, whenZero: 'no term in H⁺' },
    ),
    ', ',
    quantityField(
      file,
      { id: 'reading.junctionHydroxide', label: 'junction term of OH⁻', path: ['reading', 'junctionHydroxide'] },
      reading.junctionHydroxide,
      { unit: 'L/mol', decimals: 0, whenZero: 'no term in OH⁻' },
    ),
    '. The solvent is ',
    textField({ id: 'medium.solvent', label: 'solvent', path: ['medium', 'solvent'] }, medium.solvent, 'water'),
    '.',
  ];
}
