import { type DerivativeEndpoint, derivativeEndpoints } from '../endpoints/derivativeEndpoints.ts';
import { type GranVolume, granVolumes } from '../endpoints/gran.ts';
import { nominalValue } from '../model/quantity.ts';
import type { RunDesign } from '../model/runDesign.ts';
import type { ReadingAsPH } from './readingAsPH.ts';
import type { UsedPoints } from './usedPoints.ts';

/** Equivalence volumes that need no model. */
export interface StepsOfReadings {
  readonly derivative: readonly DerivativeEndpoint[];
  readonly gran: readonly GranVolume[];
}

/** @param uReading standard uncertainty of a reading; null: from the scatter of the readings */
export function stepsOfReadings(
  design: RunDesign,
  used: UsedPoints,
  asPH: ReadingAsPH,
  titrant: 'base' | 'acid',
  uReading: number | null,
): StepsOfReadings {
  const derivative = derivativeEndpoints(used.volumes, used.readings, uReading === null ? {} : { uReading });
  const valueFor = (id: string) => {
    const quantity = design.quantities.find((candidate) => candidate.id === id);
    return quantity === undefined ? 0 : (nominalValue(quantity) ?? 0);
  };
  const startVolume_mL = valueFor('sample.volume') + valueFor('sample.extraWater');
  const gran = granVolumes({
    volumes: used.volumes,
    pH: used.readings.map((reading) => asPH.concentrationPH(reading)),
    startVolume_mL,
    titrant,
    pKw: asPH.concentrationPKw,
    steps: derivative.map((step) => step.volume_mL),
  });
  return { derivative, gran };
}
