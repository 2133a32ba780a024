import { describe, expect, it } from 'vitest';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { sheetInconsistencies } from '../../../core/sheet/sheetInconsistencies.ts';
import { plainFacts } from '../../modelOfSheet.ts';

const sulfate = { ratio: 0.5, chargeFullyProtonated: 0, pKa: [-3, 1.99] };

describe('sheetInconsistencies', () => {
  it.each<[string, Omit<SheetFile, 'sheet'>, string, string, string]>([
    [
      'constants and groups of different number',
      { sample: { analytes: [{}, { groups: 3, pKa: [2, 'fitted'] }] } },
      'sample.analytes.1.pKa',
      'Declared are 3 ionisable groups, but 2 constants.',
      'Give one entry of pKa for every group, "fitted" where it is to be found, or leave pKa out.',
    ],
    [
      'more protons lost than there are groups',
      { sample: { analytes: [{ groups: 2, protonsLostAsWeighed: 3 }] } },
      'sample.analytes.0.protonsLostAsWeighed',
      'A substance with 2 ionisable groups cannot have lost 3 protons.',
      'Give a number from 0 to 2.',
    ],
    [
      'the same, the groups being counted by their constants',
      { sample: { analytes: [{ pKa: [4.7], protonsLostAsWeighed: 2 }] } },
      'sample.analytes.0.protonsLostAsWeighed',
      'A substance with 1 ionisable group cannot have lost 2 protons.',
      'Give a number from 0 to 1.',
    ],
    [
      'the same of a counter-ion',
      { sample: { analytes: [{ groups: 1, counterIon: { ...sulfate, protonsLostAsWeighed: 3 } }] } },
      'sample.analytes.0.counterIon.protonsLostAsWeighed',
      'A counter-ion with 2 constants cannot have lost 3 protons.',
      'Give a number from 0 to 2.',
    ],
    [
      'a titrant written both as a solution and by its strength',
      { titrant: { kind: 'solution', concentration_M: 0.1, cations_M: 0.1 } },
      'titrant.concentration_M',
      'A titrant of kind "solution" is described by cations_M, anions_M and systems, not by a strength.',
      'Take concentration_M out, or make the titrant a "base" or an "acid".',
    ],
    [
      'ions of a titrant that is not a solution',
      { titrant: { cations_M: 0.1 } },
      'titrant.kind',
      'cations_M, anions_M and systems describe a titrant of kind "solution".',
      'Set the kind of the titrant to "solution", or give its strength as concentration_M alone.',
    ],
    [
      'an offset in pH of readings in mV',
      { reading: { kind: 'mV', offset: 0.01 } },
      'reading.offset',
      'Readings in mV have E0_mV and slope, not an offset in pH.',
      'Give E0_mV in place of offset, or set the kind of the reading to "pH".',
    ],
    [
      'a standard potential of a run that holds pH',
      { reading: { E0_mV: 410 } },
      'reading.E0_mV',
      'Readings in pH have offset and slope, not a standard potential.',
      'Give offset in place of E0_mV, or set the kind of the reading to "mV".',
    ],
    [
      'another solvent without its autoprotolysis constant',
      { medium: { solvent: 'methanol', activity: 'none' } },
      'medium.pKw',
      'Nothing of water holds in methanol: its autoprotolysis constant is not known here.',
      'Declare the autoprotolysis constant of the solvent as pKw.',
    ],
    [
      'another solvent with activity coefficients of water',
      { medium: { solvent: 'methanol', pKw: 16.7 } },
      'medium.activity',
      'The Davies equation as built in holds for water, not for methanol.',
      'Set activity to "none"; constants are then those of this medium.',
    ],
    [
      'carbonate in another solvent',
      { titrant: { carbonate_M: 0.001 }, medium: { solvent: 'methanol', activity: 'none', pKw: 16.7 } },
      'medium.carbonicPKa',
      'The constants of carbonic acid in methanol are not known here.',
      'Declare them as carbonicPKa, or take the carbonate out.',
    ],
  ])('refuses %s', (_, keys, key, message, remedy) => {
    expect(sheetInconsistencies({ sheet: 1, ...keys }, plainFacts)).toEqual([
      { code: 'sheet-inconsistent', message, remedy, place: { key } },
    ]);
  });

  it.each<[string, Omit<SheetFile, 'sheet'>]>([
    ['an empty sheet', {}],
    ['an offset where the kind is left to a run in pH', { reading: { offset: 0.01 } }],
    ['a solution with systems alone', { titrant: { kind: 'solution', systems: [{ pKa: [9.2] }] } }],
    ['water named as the solvent', { medium: { solvent: 'water' } }],
    [
      'another solvent with all that it needs, carbonate of nothing included',
      { sample: { carbonate_M: 0 }, medium: { solvent: 'methanol', activity: 'none', pKw: 16.7 } },
    ],
    ['every proton lost', { sample: { analytes: [{ groups: 2, protonsLostAsWeighed: 2 }] } }],
  ])('lets pass %s', (_, keys) => {
    expect(sheetInconsistencies({ sheet: 1, ...keys }, plainFacts)).toEqual([]);
  });

  it('lets the run decide where the sheet leaves the kind of reading open', () => {
    const inMillivolts = { ...plainFacts, readingKind: 'mV' as const };
    const keys = (reading: SheetFile['reading']) =>
      sheetInconsistencies({ sheet: 1, reading }, inMillivolts).map(({ place }) => place.key);
    expect(keys({ E0_mV: 410 })).toEqual([]);
    expect(keys({ offset: 0.01 })).toEqual(['reading.offset']);
  });
});
