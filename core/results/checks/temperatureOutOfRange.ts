import { waterTemperatureRange } from '../../chemistry/waterIonProduct.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Temperatures at which the built-in properties of water do not hold. */
export function temperatureOutOfRange({ sheet }: Analysis): Doubt[] {
  const { solvent, temperature } = sheet.medium;
  const { lowest, highest } = waterTemperatureRange;
  if (solvent !== 'water' || (temperature.value >= lowest && temperature.value <= highest)) return [];
  return [
    {
      code: 'temperature-out-of-range',
      seen: `The temperature is ${temperature.value} °C; the properties of water are built in from ${lowest} to ${highest} °C.`,
      means: 'The ion product, the activity coefficients and the carbonic constants are extrapolated.',
      remedy: 'Check the temperature; declare pKw for this run where it is right.',
      place: { quantity: 'medium.temperature' },
    },
  ];
}
