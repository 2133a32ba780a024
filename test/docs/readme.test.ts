import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { resultDocument } from '../../app/terminal/resultDocument.ts';
import { carbonicConstants } from '../../core/chemistry/carbonicAcid.ts';
import { daviesUpperIonicStrength } from '../../core/chemistry/davies.ts';
import { largestGroupCount } from '../../core/chemistry/protonSystem.ts';
import { waterIonProduct, waterIonProductSource, waterTemperatureRange } from '../../core/chemistry/waterIonProduct.ts';
import { largestParameterCount } from '../../core/model/problem.ts';
import { designRun } from '../../core/model/runDesign.ts';
import { assumedCalibration, assumptions } from '../../core/sheet/assumptions.ts';
import { completeSheet } from '../../core/sheet/completeSheet.ts';
import { parseSheet } from '../../core/sheet/parseSheet.ts';
import { maximumFileBytes } from '../../core/table/maximumFileBytes.ts';
import { nernstSlope_mV } from '../../core/units/nernstSlope.ts';
import { celsius } from '../../core/units/temperature.ts';
import packageDescription from '../../package.json' with { type: 'json' };
import { perform, runOf, workUp, workUpExperiment } from '../experiment.ts';
import { plainFacts } from '../modelOfSheet.ts';
import { keysOfDocument } from './keysOfDocument.ts';
import { section } from './section.ts';
import { sheetKeys } from './sheetKeys.ts';
import { unionMembers } from './unionMembers.ts';

const top = new URL('../../', import.meta.url);
const readme = readFileSync(new URL('README.md', top), 'utf8');
const source = (path: string) => new URL(path, top);

/** What the sheet's table prints where a key is left out; the text the cell begins with. */
const leftOut = new Map(
  section(readme, 'Keys').rows.flatMap(({ names, cells }) => names.map((name) => [name, cells[3]] as const)),
);

describe('README', () => {
  it('gives commands that exist', () => {
    const named = [...readme.matchAll(/npm run (?:--silent )?([\w:-]+)/g)].map(([, script]) => script);
    expect(named.length).toBeGreaterThan(0);
    for (const script of named) expect(Object.keys(packageDescription.scripts), script).toContain(script);
    expect(readme).toContain('npm ci && npm start');
    expect(readme).toContain('npm ci && npm test');
    expect(readme).toContain(packageDescription.engines.node.replace('>=', ''));
  });

  it.each(['README.md', 'DEVELOPERS.md', 'sample-data/README.md'])('%s links to what exists', (page) => {
    const text = readFileSync(source(page), 'utf8');
    for (const [, target] of text.matchAll(/\]\(([^)]+)\)/g)) {
      const [path, anchor] = target.split('#');
      if (path !== '') expect(existsSync(new URL(path, source(page))), target).toBe(true);
      if (anchor === undefined || path !== '') continue;
      const anchors = [...text.matchAll(/^#+ (.+)$/gm)].map(([, heading]) => anchorOf(heading));
      expect(anchors, target).toContain(anchor);
    }
  });

  it('says what every exit status means', () => {
    const { names } = section(readme, 'The terminal command');
    const fit = readFileSync(source('app/terminal/fit.ts'), 'utf8');
    const statuses = [...fit.matchAll(/^const \w+ = (\d);$/gm)].map(([, status]) => status);
    expect(statuses).toEqual(['0', '1', '2']);
    expect(names.filter((name) => /^\d$/.test(name))).toEqual(statuses);
  });

  it.each([
    ['Endings', 'core/results/runResult.ts', 'RunEndingCode'],
    ['Refusals', 'core/notice/refusal.ts', 'RefusalCode'],
    ['Doubts', 'core/notice/doubt.ts', 'DoubtCode'],
  ])('lists under %s every code there is, and no other', (heading, file, union) => {
    expect([...section(readme, heading).names].sort()).toEqual(unionMembers(source(file), union).sort());
  });

  it('says why a quantity may have no uncertainty', () => {
    const row = section(readme, 'The JSON document').rows.find(({ names }) => names.includes('quantities[].whyNoU'));
    for (const reason of unionMembers(source('core/results/runResult.ts'), 'WhyNoU'))
      expect(row?.cells[1]).toContain(`"${reason}"`);
  });
});

describe('README on the JSON document', () => {
  const errors = { seed: 5, uReading: 0.005, uSetting_mL: 0.003 };
  const experiment = { pKa: [4.5], end_mL: 4, errors };
  const { volumes_mL, readings } = perform(experiment);
  const open = runOf(volumes_mL, readings);
  const slipped = {
    ...open,
    rows: open.rows.map((row, i) => (i === 20 ? { ...row, reading: row.reading + 0.5 } : row)),
  };
  // With a sheet, without one (so that there is a doubt), with a wild point, and not fitted.
  const results = [
    workUpExperiment(experiment),
    workUp(open, { sheet: 1 }),
    workUp(slipped, { sheet: 1 }),
    workUp({ ...open, rows: open.rows.slice(0, 3) }, { sheet: 1 }),
  ];
  const refusal = { code: 'file-empty', message: 'The file is empty.', remedy: 'Choose another.', place: {} } as const;
  const keys = [...keysOfDocument(JSON.parse(JSON.stringify(resultDocument(results, [refusal]))))]
    .map((key) => key.replace(/^runs\[\]\./, '').replace(/\[\]$/, ''))
    .filter((key) => !key.startsWith('doubts[].place.'));
  const named = section(readme, 'The JSON document').names.map((name) => name.replace(/\[\]$/, ''));

  it('explains every key', () => {
    expect(keys).toContain('ladder.rungs[].aicc');
    expect(keys).toContain('robust.distrusted[].line');
    expect(keys).toContain('quantities[].constant.mixed');
    for (const key of keys) expect(named, key).toContain(key);
  });

  it('explains no key that is not there', () => {
    for (const name of named)
      expect(
        keys.some((key) => key === name || key.startsWith(`${name}.`) || key.startsWith(`${name}[]`)) ||
          name === 'doubts[].place',
        name,
      ).toBe(true);
  });

  it('names every part of a place', () => {
    const parts = readFileSync(source('core/notice/place.ts'), 'utf8').matchAll(/readonly (\w+)\?:/g);
    const row = section(readme, 'The JSON document').rows.find(({ names }) => names.includes('doubts[].place'));
    expect([...parts].map(([, part]) => part).filter((part) => !row?.cells[1].includes(`\`${part}\``))).toEqual([]);
  });

  it('lists every id of a quantity', () => {
    const listed = section(readme, 'Ids of quantities').names;
    const substance = {
      pKa: [4, 9],
      counterIon: { ratio: 1, chargeFullyProtonated: 0, protonsLostAsWeighed: 0, pKa: [2] },
    };
    const sheets = [
      { sample: { analytes: [substance, substance], carbonate_M: 0.001 } },
      { sample: { cations_M: 0.1, anions_M: 0.1 }, titrant: { kind: 'solution', systems: [{ pKa: [9] }] } },
      { reading: { kind: 'mV', junctionHydrogen: 1, junctionHydroxide: 1 } },
    ] as const;
    const ids = sheets.flatMap((sheet) => {
      const parsed = parseSheet(JSON.stringify({ sheet: 1, ...sheet }), 'test');
      if (!parsed.ok) throw new Error(parsed.refusals[0].message);
      const complete = completeSheet(parsed.value, plainFacts);
      if (!complete.ok) throw new Error(complete.refusals[0].message);
      return designRun(complete.value).quantities.map(({ id }) => id);
    });
    expect(ids).toContain('analyte2.counterIon.pKa1');
    // Only the first of those that are counted on is listed, and counter-ions of the first analyte.
    const isCountedOn = (id: string) =>
      /pKa[2-9]$/.test(id) || /^analyte2\.counterIon/.test(id) || /^titrant\.system1\.pKa2$/.test(id);
    for (const id of ids) if (!isCountedOn(id)) expect(listed, id).toContain(id);
  });
});

describe('README on the sheet', () => {
  it('explains every key of the schema, and every word that may stand there', () => {
    const keys = sheetKeys();
    expect(keys.map(({ path }) => path)).toContain('sample.analytes[].counterIon.pKa[]');
    const text = section(readme, 'The sheet').text;
    for (const { path, options } of keys) {
      expect([...leftOut.keys()], path).toContain(path);
      for (const option of options) expect(text, `${option} of ${path}`).toMatch(new RegExp(`["\`]${option}["\`]`));
    }
  });

  it('explains no key that is not in the schema', () => {
    const keys = sheetKeys().map(({ path }) => path);
    for (const name of leftOut.keys())
      expect(
        keys.some((key) => key === name || key.startsWith(`${name}.`)),
        name,
      ).toBe(true);
  });

  it('shows a complete example, in which nothing is left to be assumed', () => {
    const example = /```json\n([\s\S]*?)```/.exec(section(readme, 'The sheet').text)?.[1] ?? '';
    const parsed = parseSheet(example, 'README.md');
    expect(parsed.ok ? [] : parsed.refusals).toEqual([]);
    if (!parsed.ok) return;
    const complete = completeSheet(parsed.value, plainFacts);
    if (!complete.ok) throw new Error(complete.refusals[0].message);
    // A run in pH has no standard potential.
    const { standardPotential, ...reading } = complete.value.reading;
    expect(JSON.stringify({ ...complete.value, reading })).not.toContain('"assumed":true');
  });

  it('prints every assumption as it is in the code', () => {
    const t = celsius(assumptions.temperature_C);
    const nernst = nernstSlope_mV(t);
    const E0 = (assumptions.pHAtZero * nernst).toFixed(1);
    const uE0 = (assumptions.pHAtZeroUncertainty * nernst).toFixed(1);
    const printed: Record<keyof typeof assumptions, readonly (readonly [key: string, text: string])[]> = {
      sampleVolume_mL: [['sample.volume_mL', `${assumptions.sampleVolume_mL}`]],
      extraWater_mL: [['sample.extraWater_mL', `${assumptions.extraWater_mL}`]],
      strongIon_M: [['sample.strongIon_M', `${assumptions.strongIon_M};`]],
      carbonate_M: [
        ['sample.carbonate_M', `${assumptions.carbonate_M}`],
        ['titrant.carbonate_M', `${assumptions.carbonate_M}`],
      ],
      background_M: [
        ['sample.background_M', `${assumptions.background_M}`],
        ['titrant.background_M', `${assumptions.background_M}`],
      ],
      titrantConcentration_M: [['titrant.concentration_M', `${assumptions.titrantConcentration_M}`]],
      titrantConcentrationUncertainty_M: [
        [
          'titrant.concentration_M',
          `${assumptions.titrantConcentration_M} ± ${assumptions.titrantConcentrationUncertainty_M}`,
        ],
      ],
      strengthMeans: [['titrant.strengthMeans', assumptions.strengthMeans]],
      buretteGain: [['burette.gain', `${assumptions.buretteGain}`]],
      settingUncertainty_mL: [['burette.uSetting_mL', `${assumptions.settingUncertainty_mL};`]],
      doseUncertainty_mL: [['burette.uDose_mL', `${assumptions.doseUncertainty_mL}`]],
      settingToReading_mL: [],
      temperature_C: [['medium.temperature_C', `${assumptions.temperature_C}`]],
      activity: [['medium.activity', assumptions.activity]],
      scale: [['reading.scale', assumptions.scale]],
      offset: [
        [
          'reading.offset',
          `${assumptions.offset}, known with u = ${assumptions.offsetUncertainty}, source "${assumedCalibration}"`,
        ],
      ],
      offsetUncertainty: [],
      slope: [['reading.slope', `${assumptions.slope}`]],
      pHAtZero: [
        [
          'reading.E0_mV',
          `${E0}, known with u = ${uE0} (at ${t} °C: about zero at pH ${assumptions.pHAtZero} ± ${assumptions.pHAtZeroUncertainty})`,
        ],
      ],
      pHAtZeroUncertainty: [],
      chargeFullyProtonatedOfAcid: [
        ['sample.analytes[].chargeFullyProtonated', `${assumptions.chargeFullyProtonatedOfAcid} where the pH rises`],
      ],
    };
    for (const [name, places] of Object.entries(printed))
      for (const [key, text] of places) {
        const cell = leftOut.get(key) ?? '';
        // "25" must not be satisfied by "250".
        expect(cell.startsWith(text) && !/^[\d.]/.test(cell.slice(text.length)), `${name}: ${key}`).toBe(true);
      }
    expect(section(readme, 'Noise and uncertainties').text).toContain(
      `${assumptions.settingToReading_mL} mL per unit of pH`,
    );
  });

  it('prints the constants of water as they are computed', () => {
    const t = celsius(assumptions.temperature_C);
    expect(leftOut.get('medium.pKw')).toContain(`${waterIonProduct(t).toFixed(3)} at ${t} °C`);
    expect(leftOut.get('medium.pKw')).toContain(waterIonProductSource.split(' (')[0]);
    const [first, second] = carbonicConstants(t);
    expect(leftOut.get('medium.carbonicPKa[]')).toContain(`${first.toFixed(3)} and ${second.toFixed(3)} at ${t} °C`);
  });

  it('prints limits as they are in the code', () => {
    const limits = section(readme, 'Limits').text;
    expect(limits).toContain(`up to ${daviesUpperIonicStrength} mol/L`);
    expect(limits).toContain(`up to ${largestGroupCount} groups`);
    expect(limits).toContain(`from ${waterTemperatureRange.lowest} to ${waterTemperatureRange.highest} °C`);
    expect(section(readme, 'Files that are read').text).toContain(`up to ${maximumFileBytes / 1e6} MB`);
    expect(section(readme, 'Refusals').text).toContain(`more than ${maximumFileBytes / 1e6} MB`);
    expect(section(readme, 'Refusals').text).toContain(`more than ${largestParameterCount} fitted and known`);
  });
});

/** The anchor under which a heading is reached on a rendered page. */
function anchorOf(heading: string): string {
  return heading
    .toLowerCase()
    .replace(/[^\p{L}\p{N} _-]/gu, '')
    .replaceAll(' ', '-');
}
