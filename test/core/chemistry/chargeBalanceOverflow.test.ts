import { expect, it } from 'vitest';
import { Equilibrium } from '../../../core/chemistry/equilibrium.ts';

it('a mixture with constants off any scale comes to an end, with no solution or a finite one', () => {
  const equilibrium = new Equilibrium([{ groups: 3, chargeFullyProtonated: 0 }], 0.51);
  for (const pKa of [-30, -60, -102, -103, -110, -150, -290, -305, -400]) {
    equilibrium.balance.setConstants([pKa, pKa / 2, pKa / 3], 14);
    const solved = equilibrium.solve(Float64Array.of(0.1, 0.1, 0.01), -7 * Math.LN10, 0.1);
    if (solved) expect(Number.isFinite(equilibrium.logHydrogen)).toBe(true);
    expect(typeof solved).toBe('boolean');
  }
});
