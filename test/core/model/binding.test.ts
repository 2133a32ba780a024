import { describe, expect, it } from 'vitest';
import { type Binding, bindingTerms, boundValue } from '../../../core/model/binding.ts';

const parameters = Float64Array.of(2, -1, 0.5);

describe('a binding', () => {
  it('of a constant has its value and no derivative', () => {
    const binding: Binding = { kind: 'constant', value: 25 };
    expect(boundValue(binding, parameters)).toBe(25);
    expect(bindingTerms(binding)).toEqual([]);
  });

  it('of a parameter is that parameter', () => {
    const binding: Binding = { kind: 'parameter', parameter: 2 };
    expect(boundValue(binding, parameters)).toBe(0.5);
    expect(bindingTerms(binding)).toEqual([{ parameter: 2, sensitivity: 1 }]);
  });

  it('of declared knowledge is the nominal value and the errors of its sources', () => {
    const terms = [
      { parameter: 0, sensitivity: 0.25 },
      { parameter: 1, sensitivity: 0.5 },
    ];
    const binding: Binding = { kind: 'known', nominal: 10, terms };
    // 10 + 0.25 · 2 + 0.5 · (−1); all exact in binary.
    expect(boundValue(binding, parameters)).toBe(10);
    expect(bindingTerms(binding)).toEqual(terms);
  });
});
