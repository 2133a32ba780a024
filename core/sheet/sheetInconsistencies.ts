import type { Refusal } from '../notice/refusal.ts';
import type { RunFacts } from './runFacts.ts';
import type { AnalyteFile, SheetFile } from './sheetFile.ts';

function named(key: string, substance: AnalyteFile): AnalyteFile & { key: string } {
  return { key, ...substance };
}

function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

/** Keys of a sheet that are each in order but contradict one another, or the run. */
export function sheetInconsistencies(file: SheetFile, facts: RunFacts): readonly Refusal[] {
  const refusals: Refusal[] = [];
  const refuse = (key: string, message: string, remedy: string) =>
    refusals.push({ code: 'sheet-inconsistent', message, remedy, place: { key } });

  const substances = [
    ...(file.sample?.analytes ?? []).map((analyte, i) => named(`sample.analytes.${i}`, analyte)),
    ...(file.sample?.systems ?? []).map((system, i) => named(`sample.systems.${i}`, system)),
    ...(file.titrant?.systems ?? []).map((system, i) => named(`titrant.systems.${i}`, system)),
  ];
  for (const substance of substances) {
    const groups = substance.groups ?? substance.pKa?.length;
    if (substance.groups !== undefined && substance.pKa !== undefined && substance.pKa.length !== substance.groups)
      refuse(
        `${substance.key}.pKa`,
        `Declared are ${counted(substance.groups, 'ionisable group')}, but ${counted(substance.pKa.length, 'constant')}.`,
        'Give one entry of pKa for every group, "fitted" where it is to be found, or leave pKa out.',
      );
    const lost = substance.protonsLostAsWeighed;
    if (lost !== undefined && groups !== undefined && lost > groups)
      refuse(
        `${substance.key}.protonsLostAsWeighed`,
        `A substance with ${counted(groups, 'ionisable group')} cannot have lost ${counted(lost, 'proton')}.`,
        `Give a number from 0 to ${groups}.`,
      );
    const counterIon = substance.counterIon;
    if (counterIon !== undefined && counterIon.protonsLostAsWeighed > counterIon.pKa.length)
      refuse(
        `${substance.key}.counterIon.protonsLostAsWeighed`,
        `A counter-ion with ${counted(counterIon.pKa.length, 'constant')} cannot have lost ${counted(counterIon.protonsLostAsWeighed, 'proton')}.`,
        `Give a number from 0 to ${counterIon.pKa.length}.`,
      );
  }

  const titrant = file.titrant ?? {};
  if (titrant.kind === 'solution') {
    if (titrant.concentration_M !== undefined)
      refuse(
        'titrant.concentration_M',
        'A titrant of kind "solution" is described by cations_M, anions_M and systems, not by a strength.',
        'Take concentration_M out, or make the titrant a "base" or an "acid".',
      );
  } else if (titrant.cations_M !== undefined || titrant.anions_M !== undefined || titrant.systems !== undefined)
    refuse(
      'titrant.kind',
      'cations_M, anions_M and systems describe a titrant of kind "solution".',
      'Set the kind of the titrant to "solution", or give its strength as concentration_M alone.',
    );

  const reading = file.reading ?? {};
  const readingKind = reading.kind ?? facts.readingKind;
  if (readingKind === 'mV' && reading.offset !== undefined)
    refuse(
      'reading.offset',
      'Readings in mV have E0_mV and slope, not an offset in pH.',
      'Give E0_mV in place of offset, or set the kind of the reading to "pH".',
    );
  if (readingKind === 'pH' && reading.E0_mV !== undefined)
    refuse(
      'reading.E0_mV',
      'Readings in pH have offset and slope, not a standard potential.',
      'Give offset in place of E0_mV, or set the kind of the reading to "mV".',
    );

  const medium = file.medium ?? {};
  if (medium.solvent !== undefined && medium.solvent !== 'water') {
    if (medium.pKw === undefined)
      refuse(
        'medium.pKw',
        `Nothing of water holds in ${medium.solvent}: its autoprotolysis constant is not known here.`,
        'Declare the autoprotolysis constant of the solvent as pKw.',
      );
    if (medium.activity !== 'none')
      refuse(
        'medium.activity',
        `The Davies equation as built in holds for water, not for ${medium.solvent}.`,
        'Set activity to "none"; constants are then those of this medium.',
      );
    const carbonate = file.sample?.carbonate_M ?? titrant.carbonate_M;
    if (carbonate !== undefined && carbonate !== 0 && medium.carbonicPKa === undefined)
      refuse(
        'medium.carbonicPKa',
        `The constants of carbonic acid in ${medium.solvent} are not known here.`,
        'Declare them as carbonicPKa, or take the carbonate out.',
      );
  }
  return refusals;
}
