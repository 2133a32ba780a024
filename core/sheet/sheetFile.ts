import * as v from 'valibot';

/** Version of the sheet format this software writes. */
export const sheetVersion = 1;

/** Range in which the value of a quantity makes sense, with the words a refusal uses. */
interface Range {
  readonly lowest: number;
  readonly highest: number;
  /** True where the lowest value itself is excluded. */
  readonly open?: boolean;
}

function finite(range: Range) {
  const words = `between ${range.lowest}${range.open === true ? ' (not included)' : ''} and ${range.highest}`;
  return v.pipe(
    v.number('a number'),
    v.check(
      (value) => (range.open === true ? value > range.lowest : value >= range.lowest) && value <= range.highest,
      `a number ${words}`,
    ),
  );
}

const positive = v.pipe(
  v.number('a number'),
  v.check((value) => value > 0 && Number.isFinite(value), 'a positive number'),
);
const notNegative = v.pipe(
  v.number('a number'),
  v.check((value) => value >= 0 && Number.isFinite(value), 'a number that is not negative'),
);
const source = v.optional(v.pipe(v.string('a text'), v.minLength(1, 'a text that is not empty')));

/** A quantity: a bare number is fixed, value with uncertainty is known, the rest is fitted. */
function quantity(range: Range) {
  const value = finite(range);
  return v.union(
    [
      value,
      v.literal('fitted'),
      v.strictObject({ fitted: v.literal(true), start: v.optional(value) }),
      v.strictObject({ value, u: positive, source }),
      v.strictObject({ value, U: positive, k: positive, source }),
      v.strictObject({
        value,
        tolerance: positive,
        distribution: v.picklist(['rectangular', 'triangular', 'normal']),
        source,
      }),
    ],
    `a number from ${range.lowest} to ${range.highest}, "fitted", {"fitted": true, "start"}, {"value", "u"}, {"value", "U", "k"} or {"value", "tolerance", "distribution"} with a positive uncertainty` as string,
  );
}

// Ranges wider than any titration: they catch slips of unit, not unusual chemistry.
const volume = quantity({ lowest: 0, highest: 1e5, open: true });
const addedVolume = quantity({ lowest: 0, highest: 1e5 });
const concentration = quantity({ lowest: 0, highest: 20 });
const strength = quantity({ lowest: 0, highest: 20, open: true });
const signedConcentration = quantity({ lowest: -20, highest: 20 });
const acidity = quantity({ lowest: -12, highest: 26 });
const ionProduct = quantity({ lowest: 5, highest: 40 });

const charge = v.pipe(
  v.number('a whole number'),
  v.integer('a whole number'),
  v.minValue(-6, 'a charge from -6 to 6'),
  v.maxValue(6, 'a charge from -6 to 6'),
);
const count = (lowest: number, highest: number) =>
  v.pipe(
    v.number('a whole number'),
    v.integer('a whole number'),
    v.check((value) => value >= lowest && value <= highest, `a whole number from ${lowest} to ${highest}`),
  );

const counterIon = v.strictObject({
  name: v.optional(v.string('a text')),
  /** Counter-ions per molecule of analyte. */
  ratio: positive,
  chargeFullyProtonated: charge,
  protonsLostAsWeighed: count(0, 6),
  pKa: v.pipe(
    v.array(acidity, 'a list'),
    v.minLength(1, 'a list of 1 to 6 constants'),
    v.maxLength(6, 'a list of 1 to 6 constants'),
  ),
});

const analyte = v.strictObject({
  name: v.optional(v.string('a text')),
  groups: v.optional(count(0, 6)),
  chargeFullyProtonated: v.optional(charge),
  protonsLostAsWeighed: v.optional(count(0, 6)),
  concentration_M: v.optional(concentration),
  pKa: v.optional(v.pipe(v.array(acidity, 'a list'), v.maxLength(6, 'a list of at most 6 constants'))),
  counterIon: v.optional(counterIon),
});

const system = v.strictObject({
  name: v.optional(v.string('a text')),
  groups: v.optional(count(1, 6)),
  chargeFullyProtonated: v.optional(charge),
  concentration_M: v.optional(concentration),
  pKa: v.optional(
    v.pipe(
      v.array(acidity, 'a list'),
      v.minLength(1, 'a list of 1 to 6 constants'),
      v.maxLength(6, 'a list of 1 to 6 constants'),
    ),
  ),
});

/** Keys that both vessels share. */
const vesselKeys = {
  strongIon_M: v.optional(signedConcentration),
  carbonate_M: v.optional(concentration),
  background_M: v.optional(concentration),
  cations_M: v.optional(concentration),
  anions_M: v.optional(concentration),
  systems: v.optional(v.array(system, 'a list')),
};

/** The sheet as it stands in a file: everything but the version may be left out. */
export const sheetFileSchema = v.strictObject({
  sheet: v.literal(sheetVersion),
  sample: v.optional(
    v.strictObject({
      volume_mL: v.optional(volume),
      extraWater_mL: v.optional(addedVolume),
      analytes: v.optional(v.array(analyte, 'a list')),
      ...vesselKeys,
    }),
  ),
  titrant: v.optional(
    v.strictObject({
      kind: v.optional(v.picklist(['base', 'acid', 'solution'], '"base", "acid" or "solution"')),
      name: v.optional(v.string('a text')),
      concentration_M: v.optional(strength),
      strengthMeans: v.optional(
        v.picklist(
          ['hydroxide', 'toHydrogencarbonate', 'totalBase'],
          '"hydroxide", "toHydrogencarbonate" or "totalBase"',
        ),
      ),
      ...vesselKeys,
    }),
  ),
  burette: v.optional(
    v.strictObject({
      gain: v.optional(quantity({ lowest: 0.5, highest: 2 })),
      uSetting_mL: v.optional(notNegative),
      uDose_mL: v.optional(notNegative),
    }),
  ),
  medium: v.optional(
    v.strictObject({
      solvent: v.optional(v.pipe(v.string('a text'), v.minLength(1, 'a text that is not empty'))),
      temperature_C: v.optional(finite({ lowest: -50, highest: 200 })),
      activity: v.optional(v.picklist(['davies', 'none'], '"davies" or "none"')),
      pKw: v.optional(ionProduct),
      carbonicPKa: v.optional(v.tuple([acidity, acidity], 'a list of two constants')),
    }),
  ),
  reading: v.optional(
    v.strictObject({
      kind: v.optional(v.picklist(['pH', 'mV'], '"pH" or "mV"')),
      scale: v.optional(v.picklist(['activity', 'concentration'], '"activity" or "concentration"')),
      offset: v.optional(quantity({ lowest: -10, highest: 10 })),
      slope: v.optional(quantity({ lowest: 0.1, highest: 2 })),
      E0_mV: v.optional(quantity({ lowest: -5000, highest: 5000 })),
      junctionHydrogen: v.optional(quantity({ lowest: -1e4, highest: 1e4 })),
      junctionHydroxide: v.optional(quantity({ lowest: -1e4, highest: 1e4 })),
      u: v.optional(positive),
    }),
  ),
});

/** The sheet as it stands in a file, checked. */
export type SheetFile = v.InferOutput<typeof sheetFileSchema>;

/** A quantity as it stands in a file. */
export type QuantityFile = v.InferOutput<typeof volume>;

/** An analyte as it stands in a file. */
export type AnalyteFile = v.InferOutput<typeof analyte>;
