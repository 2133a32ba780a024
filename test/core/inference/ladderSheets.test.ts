import { describe, expect, it } from 'vitest';
import { ladderSheets } from '../../../core/inference/ladderSheets.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import type { Sheet } from '../../../core/sheet/sheet.ts';
import type { AnalyteFile, SheetFile } from '../../../core/sheet/sheetFile.ts';

function sheetOf(analyte: AnalyteFile, kind: 'base' | 'acid' = 'base', changes: Partial<SheetFile> = {}): Sheet {
  const complete = completeSheet(
    { sheet: 1, titrant: { kind }, ...changes, sample: { ...changes.sample, analytes: [analyte] } },
    { readingKind: 'pH', titrantKind: kind, groupsIfOpen: 1 },
  );
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  return complete.value;
}

function analyteWith(sheet: Sheet, groups: number) {
  const sheets = ladderSheets(sheet);
  const { sheet: varied, keys } = sheets.sheetFor(sheets.plain(groups));
  const [{ pKa, chargeFullyProtonated, protonsLostAsWeighed }] = varied.sample.analytes;
  return {
    keys,
    charge: chargeFullyProtonated.value,
    lost: protonsLostAsWeighed?.value,
    states: pKa.map(({ state }) => state),
  };
}

describe('the sheets of a ladder', () => {
  it('add groups where the titrant arrives last, and keep the charge of the weighed form', () => {
    const acid = sheetOf({ groups: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 });
    expect(analyteWith(acid, 3)).toMatchObject({ keys: [0, 1, 2], charge: 0, lost: 0 });
    const base = sheetOf({ groups: 1, chargeFullyProtonated: 1, protonsLostAsWeighed: 1 }, 'acid');
    expect(analyteWith(base, 3)).toMatchObject({ keys: [-2, -1, 0], charge: 3, lost: 3 });
  });

  it('leave out the groups that the titrant does not reach first', () => {
    const hydrogenSalt = sheetOf({ groups: 2, chargeFullyProtonated: 0, protonsLostAsWeighed: 1 });
    expect(analyteWith(hydrogenSalt, 1)).toMatchObject({ keys: [1], charge: -1, lost: 0 });
    expect(analyteWith(sheetOf({ groups: 3, chargeFullyProtonated: 0, protonsLostAsWeighed: 0 }), 2)).toMatchObject({
      keys: [0, 1],
      charge: 0,
      lost: 0,
    });
  });

  it('keep constants that are declared by number', () => {
    const sheet = sheetOf({ pKa: ['fitted', 'fitted', 6.4], chargeFullyProtonated: 0, protonsLostAsWeighed: 0 });
    expect(ladderSheets(sheet).fewest).toBe(1);
    expect(analyteWith(sheet, 2)).toMatchObject({ keys: [0, 2], states: ['fitted', 'fixed'] });
    expect(analyteWith(sheet, 4)).toMatchObject({ keys: [0, 1, 2, 3] });
  });

  it('fit a strong acid or base where no group is left', () => {
    const sheets = ladderSheets(sheetOf({ groups: 2 }));
    const { sheet } = sheets.sheetFor(sheets.plain(0));
    expect(sheet.sample.analytes).toHaveLength(0);
    expect(sheet.sample.strongIon.state).toBe('fitted');
  });

  it('seek carbonate in a base, or in the sample of an acid', () => {
    const kind = { groups: 1, carbonate: true, excess: false };
    const withBase = ladderSheets(sheetOf({ groups: 1 })).sheetFor(kind).sheet;
    expect([withBase.titrant.carbonate.state, withBase.sample.carbonate.state]).toEqual(['fitted', 'fixed']);
    const withAcid = ladderSheets(sheetOf({ groups: 1 }, 'acid')).sheetFor(kind).sheet;
    expect([withAcid.titrant.carbonate.state, withAcid.sample.carbonate.state]).toEqual(['fixed', 'fitted']);
  });

  it('ask nothing of what is known or fitted anyway', () => {
    const known = sheetOf({ groups: 1 }, 'base', {
      titrant: { kind: 'base', carbonate_M: { value: 0.001, u: 0.0002 } },
      sample: { strongIon_M: 'fitted' },
    });
    const { carbonate, excess, plain } = ladderSheets(known);
    expect([carbonate, excess]).toEqual(['as-declared', 'always']);
    expect(plain(2)).toEqual({ groups: 2, carbonate: false, excess: true });
  });

  it('vary one substance of several, and never leave it out', () => {
    const complete = completeSheet(
      { sheet: 1, sample: { analytes: [{ groups: 2 }, {}] } },
      { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 },
    );
    if (!complete.ok) throw new Error('a sheet in order');
    const sheets = ladderSheets(complete.value);
    expect([sheets.prefix, sheets.fewest]).toEqual(['analyte2.', 1]);
    expect(sheets.sheetFor(sheets.plain(3)).sheet.sample.analytes.map(({ groups }) => groups.value)).toEqual([2, 3]);
  });
});
