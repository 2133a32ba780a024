import { largestGroupCount } from '../chemistry/protonSystem.ts';
import type { Declaration } from '../sheet/declaration.ts';
import type { Analyte, Sheet } from '../sheet/sheet.ts';

/** What is fitted in one rung of a ladder beside what the sheet itself leaves open. */
export interface RungKind {
  readonly groups: number;
  /** Whether carbonate is fitted: that of a base titrant, else that of the sample. */
  readonly carbonate: boolean;
  /** Whether strong acid or base in the sample is fitted. */
  readonly excess: boolean;
}

/** One rung before it is fitted. */
export interface RungSheet extends RungKind {
  readonly sheet: Sheet;
  /** Names of the groups, in the order of their constants: a group has the same name in every rung that has it. */
  readonly keys: readonly number[];
}

/** All rungs that a sheet allows. */
export interface LadderSheets {
  /** Number of groups that the sheet declares; null where it leaves it open. */
  readonly declared: number | null;
  /** Prefix of the ids of the substance whose groups are counted. */
  readonly prefix: string;
  /** What may be asked of carbonate: nothing, whether it is there, or nothing because it is fitted anyway. */
  readonly carbonate: 'as-declared' | 'open' | 'always';
  readonly excess: 'as-declared' | 'open' | 'always';
  /** Which vessel the carbonate is sought in. */
  readonly carbonateVessel: 'sample' | 'titrant';
  /** Smallest number of groups: those whose constants are declared by number stay. */
  readonly fewest: number;
  readonly largest: number;
  /** What is fitted with so many groups if nothing is asked beyond the sheet; without any group a strong acid or base is. */
  readonly plain: (groups: number) => RungKind;
  /** The same with all that may be asked for. */
  readonly richest: (groups: number) => RungKind;
  readonly sheetFor: (kind: RungKind) => RungSheet;
}

const fitted: Declaration = { state: 'fitted', start: null, assumed: false };

/**
 * The sheets of all rungs of a ladder: the given sheet with other numbers of
 * groups, with carbonate, with an excess; everything else as declared.
 *
 * Counted are the groups of the first substance whose number is open, else of
 * the first. Its weighed form keeps its charge. Constants declared by number
 * stay in every rung. Carbonate is sought where it comes from: in a base that
 * has met the air, or, where the titrant is an acid, in the sample.
 */
export function ladderSheets(sheet: Sheet): LadderSheets {
  const { analytes } = sheet.sample;
  const open = analytes.findIndex((analyte) => analyte.groups.assumed);
  const counted = open < 0 ? 0 : open;
  const analyte: Analyte | undefined = analytes[counted];
  const declared = analyte ?? newAnalyte;
  const acid = sheet.titrant.kind.value === 'acid';
  const given = analyte === undefined ? 0 : declared.pKa.filter(({ state }) => state !== 'fitted').length;
  const carbonateVessel = sheet.titrant.kind.value === 'base' ? 'titrant' : 'sample';
  const inWater = sheet.medium.solvent === 'water';
  const carbonateQuestion = inWater ? question(sheet[carbonateVessel].carbonate) : 'as-declared';
  const excessQuestion = question(sheet.sample.strongIon);
  return {
    declared: analyte === undefined ? 0 : analyte.groups.assumed ? null : analyte.groups.value,
    prefix: counted === 0 ? '' : `analyte${counted + 1}.`,
    carbonate: carbonateQuestion,
    excess: excessQuestion,
    carbonateVessel,
    // Without the counted substance the others would change their names; no run asks whether it is there at all.
    fewest: Math.max(given, analytes.length > 1 ? 1 : 0),
    largest: largestGroupCount,
    plain: (groups) => ({
      groups,
      carbonate: carbonateQuestion === 'always',
      excess: excessQuestion === 'always' || groups === 0,
    }),
    richest: (groups) => ({
      groups,
      carbonate: carbonateQuestion !== 'as-declared',
      excess: excessQuestion !== 'as-declared' || groups === 0,
    }),
    sheetFor: (kind) => {
      const varied = kind.groups === 0 ? null : withGroups(declared, kind.groups, acid);
      const changed = varied === null ? [] : [varied.analyte];
      const strongIon = opened(sheet.sample.strongIon, kind.excess);
      const carbonate = opened(sheet[carbonateVessel].carbonate, kind.carbonate);
      const sample = {
        ...sheet.sample,
        strongIon,
        analytes: analytes.length === 0 ? changed : analytes.flatMap((other, i) => (i === counted ? changed : [other])),
      };
      return {
        ...kind,
        sheet:
          carbonateVessel === 'sample'
            ? { ...sheet, sample: { ...sample, carbonate } }
            : { ...sheet, sample, titrant: { ...sheet.titrant, carbonate } },
        keys: varied?.keys ?? [],
      };
    },
  };
}

/** A substance of which nothing is known, for a sheet that declares none; `withGroups` gives it its groups. */
const newAnalyte: Analyte = {
  name: { value: 'analyte', assumed: true },
  groups: { value: 0, assumed: true },
  chargeFullyProtonated: { value: 0, assumed: true },
  protonsLostAsWeighed: { value: 0, assumed: true },
  counterIon: null,
  concentration: fitted,
  pKa: [],
};

function opened(declaration: Declaration, open: boolean): Declaration {
  return open && declaration.state === 'fixed' ? fitted : declaration;
}

function question(declaration: Declaration): 'as-declared' | 'open' | 'always' {
  switch (declaration.state) {
    case 'fixed':
      return 'open';
    case 'known':
      return 'as-declared';
    case 'fitted':
      return 'always';
  }
}

/**
 * A substance with another number of groups. Groups are added, and those left
 * out that the titrant would reach last: an acid is added at the lower end of
 * the constants, a base at the upper. Groups beyond the weighed form go first.
 */
function withGroups(analyte: Analyte, count: number, acid: boolean): { analyte: Analyte; keys: number[] } {
  let charge = analyte.chargeFullyProtonated.value;
  let lost = analyte.protonsLostAsWeighed?.value ?? Math.max(0, Math.min(charge, analyte.pKa.length));
  const groups = analyte.pKa.map((pKa, key) => ({ key, pKa }));
  while (groups.length > count) {
    const lower = groups.findIndex(({ pKa }) => pKa.state === 'fitted');
    const upper = groups.findLastIndex(({ pKa }) => pKa.state === 'fitted');
    const place = acid ? (upper >= lost ? upper : lower) : lower < lost ? lower : upper;
    groups.splice(place, 1);
    if (place >= lost) continue;
    charge--;
    lost--;
  }
  while (groups.length < count) {
    if (!acid) groups.push({ key: groups.length === 0 ? 0 : groups[groups.length - 1].key + 1, pKa: fitted });
    else {
      groups.unshift({ key: groups.length === 0 ? 0 : groups[0].key - 1, pKa: fitted });
      charge++;
      lost++;
    }
  }
  return {
    analyte: {
      ...analyte,
      groups: { ...analyte.groups, value: count },
      chargeFullyProtonated: { ...analyte.chargeFullyProtonated, value: charge },
      protonsLostAsWeighed:
        analyte.protonsLostAsWeighed === null ? null : { ...analyte.protonsLostAsWeighed, value: lost },
      pKa: groups.map(({ pKa }) => pKa),
    },
    keys: groups.map(({ key }) => key),
  };
}
