import { describe, expect, it } from 'vitest';
import { roleFromHeader } from '../../../core/run/roleFromHeader.ts';

describe('roleFromHeader', () => {
  it.each([
    ['V (mL)', '', 'volume', 'mL'],
    ['V', '', 'volume', undefined],
    ['V', 'mL', 'volume', 'mL'],
    ['volume_ml', '', 'volume', 'mL'],
    ['Volumen [µl]', '', 'volume', 'µL'],
    ['Zugabe / mL', '', 'volume', 'mL'],
    ['mL NaOH', '', 'volume', undefined],
    ['Vol. ajouté (cm³)', '', 'volume', 'mL'],
    ['Volumen añadido', '', 'volume', undefined],
    ['Toegevoegd volume (L)', '', 'volume', 'L'],
    ['Titriermittel', '', 'volume', undefined],
    ['pH', '', 'pH', undefined],
    ['pH-Wert', '', 'pH', undefined],
    ['measured pH', '', 'pH', undefined],
    ['pH2', '', 'pH', undefined],
    ['E (mV)', '', 'mV', 'mV'],
    ['U/V', '', 'mV', 'V'],
    ['Spannung', 'mV', 'mV', 'mV'],
    ['Potenziale', '', 'mV', undefined],
    ['Tensão [mV]', '', 'mV', 'mV'],
    ['Messwert', '', 'reading', undefined],
    ['t (s)', '', 'time', 's'],
    ['Zeit', '', 'time', undefined],
    ['T (°C)', '', 'temperature', '°C'],
    ['Température', '', 'temperature', undefined],
    ['sample_id', '', 'sample', undefined],
    ['Échantillon', '', 'sample', undefined],
    ['Probe Nr.', '', 'sample', undefined],
    ['Nr.', '', 'index', undefined],
    ['#', '', 'index', undefined],
    ['dpH/dV', '', 'derivative', undefined],
    ['ΔpH/ΔV', '', 'derivative', undefined],
    ['d(pH)/d(V)', '', 'derivative', undefined],
    ['d²pH/dV²', '', 'derivative', undefined],
    ['1. Ableitung', '', 'derivative', undefined],
    ['dE (mV)', '', 'derivative', undefined],
    ['dV (mL)', '', 'increment', 'mL'],
    ['Drift (mV/min)', '', 'derivative', undefined],
    ['phase', '', undefined, undefined],
    ['', '', undefined, undefined],
    ['', 'mL', 'volume', 'mL'],
    ['foo', '', undefined, undefined],
  ] as const)('takes %j with unit row %j for %s in %s', (header, units, role, unit) => {
    const read = roleFromHeader(header, units);
    expect([read.role, read.unit]).toEqual([role, unit]);
  });
});
