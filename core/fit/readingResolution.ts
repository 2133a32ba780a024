/** More decimals than any export prints. */
const mostDecimals = 8;

/**
 * The last digit of a column of readings, such as 0.01: the smallest power of
 * ten that all of them are whole multiples of. In the unit of the readings.
 */
export function readingResolution(readings: Float64Array): number {
  let decimals = 0;
  for (const reading of readings) {
    while (decimals < mostDecimals) {
      const scaled = reading * 10 ** decimals;
      // Written numbers come back from binary to within a few units of the last place.
      if (Math.abs(scaled - Math.round(scaled)) <= 1e-9 * Math.max(1, Math.abs(scaled))) break;
      decimals++;
    }
  }
  return 10 ** -decimals;
}
