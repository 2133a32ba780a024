import { describe, expect, it } from 'vitest';
import { boundValue } from '../../../core/model/binding.ts';
import { buildProblem, type DeclaredRun, type Problem } from '../../../core/model/problem.ts';
import { completeSheet } from '../../../core/sheet/completeSheet.ts';
import type { SheetFile } from '../../../core/sheet/sheetFile.ts';
import { plainFacts } from '../../modelOfSheet.ts';

function run(keys: Omit<SheetFile, 'sheet'>): DeclaredRun {
  const sheet = completeSheet({ sheet: 1, reading: { offset: 0 }, ...keys }, plainFacts);
  if (!sheet.ok) throw new Error(sheet.refusals[0].message);
  return { sheet: sheet.value, volumes: new Float64Array(3), readings: new Float64Array(3) };
}

function problemOf(runs: readonly DeclaredRun[], shared?: readonly string[]): Problem {
  const problem = buildProblem(runs, shared);
  if (!problem.ok) throw new Error(problem.refusals[0].message);
  return problem.value;
}

const acid = { sample: { analytes: [{ groups: 1 }] }, titrant: { concentration_M: 0.1 } };

describe('buildProblem', () => {
  it('gives every run its own fitted quantities', () => {
    const { parameters } = problemOf([run(acid), run(acid)]);
    expect(parameters.map(({ id, runs }) => [id, ...runs])).toEqual([
      ['pKa1', 0],
      ['concentration', 0],
      ['pKa1', 1],
      ['concentration', 1],
    ]);
  });

  it('shares those that are named', () => {
    const { parameters, runs } = problemOf([run(acid), run(acid)], ['pKa1']);
    expect(parameters.map(({ id, runs: users }) => [id, ...users])).toEqual([
      ['pKa1', 0, 1],
      ['concentration', 0],
      ['concentration', 1],
    ]);
    expect(runs[0].bindings[0]).toEqual({ kind: 'parameter', parameter: 0 });
    expect(runs[1].bindings[0]).toEqual({ kind: 'parameter', parameter: 0 });
  });

  it('shares the error of a source, each quantity with its own sensitivity', () => {
    const bottle = 'standardisation 12';
    const known = (value: number, u: number, source?: string) => ({
      ...acid,
      titrant: { concentration_M: { value, u, ...(source === undefined ? {} : { source }) } },
    });
    const { parameters, runs } = problemOf([
      run(known(0.1, 0.0002, bottle)),
      run(known(0.05, 0.0001, bottle)),
      run(known(0.1, 0.0002)),
      run(known(0.1, 0.0002)),
    ]);
    const knowledge = parameters.filter(({ kind }) => kind === 'knowledge');
    expect(knowledge.map(({ id, runs: users }) => [id, ...users])).toEqual([
      [bottle, 0, 1],
      ['titrant.concentration', 2],
      ['titrant.concentration', 3],
    ]);
    const values = new Float64Array(parameters.length);
    values[parameters.findIndex(({ id }) => id === bottle)] = 2;
    const strengths = runs.map(({ design, bindings }) =>
      boundValue(bindings[design.quantities.findIndex(({ id }) => id === 'titrant.concentration')], values),
    );
    // Two standard uncertainties above nominal in both runs of the bottle, nominal in the others.
    expect(strengths.map((value) => Number(value.toFixed(12)))).toEqual([0.1004, 0.0502, 0.1, 0.1]);
  });

  it('refuses more than 150 parameters', () => {
    const many = (count: number) => buildProblem(Array.from({ length: count }, () => run(acid)));
    expect(many(75).ok).toBe(true);
    const refused = many(76);
    expect(refused.ok ? [] : refused.refusals).toMatchObject([
      {
        code: 'problem-too-large',
        message: 'These runs together have 152 fitted and known quantities; at most 150 can be handled in one problem.',
      },
    ]);
  });
});
