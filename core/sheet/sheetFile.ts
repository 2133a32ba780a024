import * as v from 'valibot';
import { largestGroupCount } from '../chemistry/protonSystem.ts';
import { quantityIn } from './quantityFile.ts';
import { anyText, integerIn, listOf, notNegative, numberIn, objectOf, positive, text } from './sheetParts.ts';

export type { QuantityFile } from './quantityFile.ts';

/** Version of the sheet format this software writes. */
export const sheetVersion = 1;

// Ranges wider than any titration: they catch slips of unit, not unusual chemistry.
const volume = quantityIn({ lowest: 0, highest: 1e5, open: true });
const addedVolume = quantityIn({ lowest: 0, highest: 1e5 });
const concentration = quantityIn({ lowest: 0, highest: 20 });
const strength = quantityIn({ lowest: 0, highest: 20, open: true });
const signedConcentration = quantityIn({ lowest: -20, highest: 20 });
const acidity = quantityIn({ lowest: -12, highest: 26 });
const ionProduct = quantityIn({ lowest: 5, highest: 40 });

const charge = integerIn(-6, 6);
const protonsLost = integerIn(0, largestGroupCount);

const counterIon = objectOf({
  name: v.optional(anyText),
  /** Counter-ions per molecule of analyte. */
  ratio: positive,
  chargeFullyProtonated: charge,
  protonsLostAsWeighed: protonsLost,
  pKa: listOf(acidity, 1, largestGroupCount),
});

const analyte = objectOf({
  name: v.optional(anyText),
  groups: v.optional(integerIn(0, largestGroupCount)),
  chargeFullyProtonated: v.optional(charge),
  protonsLostAsWeighed: v.optional(protonsLost),
  concentration_M: v.optional(concentration),
  pKa: v.optional(listOf(acidity, 0, largestGroupCount)),
  counterIon: v.optional(counterIon),
});

const system = objectOf({
  name: v.optional(anyText),
  groups: v.optional(integerIn(1, largestGroupCount)),
  chargeFullyProtonated: v.optional(charge),
  concentration_M: v.optional(concentration),
  pKa: v.optional(listOf(acidity, 1, largestGroupCount)),
});

/** More substances than this in one vessel are a slip, not a titration. */
const largestSubstanceCount = 20;

/** Keys that both vessels share. */
const vesselKeys = {
  strongIon_M: v.optional(signedConcentration),
  carbonate_M: v.optional(concentration),
  background_M: v.optional(concentration),
  cations_M: v.optional(concentration),
  anions_M: v.optional(concentration),
  systems: v.optional(listOf(system, 0, largestSubstanceCount)),
};

/** The sheet as it stands in a file: everything but the version may be left out. */
export const sheetFileSchema = objectOf({
  sheet: v.literal(sheetVersion),
  sample: v.optional(
    objectOf({
      volume_mL: v.optional(volume),
      extraWater_mL: v.optional(addedVolume),
      analytes: v.optional(listOf(analyte, 0, largestSubstanceCount)),
      ...vesselKeys,
    }),
  ),
  titrant: v.optional(
    objectOf({
      kind: v.optional(v.picklist(['base', 'acid', 'solution'], '"base", "acid" or "solution"')),
      name: v.optional(anyText),
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
    objectOf({
      gain: v.optional(quantityIn({ lowest: 0.5, highest: 2 })),
      uSetting_mL: v.optional(notNegative),
      uDose_mL: v.optional(notNegative),
    }),
  ),
  medium: v.optional(
    objectOf({
      solvent: v.optional(text),
      temperature_C: v.optional(numberIn({ lowest: -50, highest: 200 })),
      activity: v.optional(v.picklist(['davies', 'none'], '"davies" or "none"')),
      pKw: v.optional(ionProduct),
      carbonicPKa: v.optional(v.strictTuple([acidity, acidity], 'a list of two constants in square brackets')),
    }),
  ),
  reading: v.optional(
    objectOf({
      kind: v.optional(v.picklist(['pH', 'mV'], '"pH" or "mV"')),
      scale: v.optional(v.picklist(['activity', 'concentration'], '"activity" or "concentration"')),
      offset: v.optional(quantityIn({ lowest: -10, highest: 10 })),
      slope: v.optional(quantityIn({ lowest: 0.1, highest: 2 })),
      E0_mV: v.optional(quantityIn({ lowest: -5000, highest: 5000 })),
      junctionHydrogen: v.optional(quantityIn({ lowest: -1e4, highest: 1e4 })),
      junctionHydroxide: v.optional(quantityIn({ lowest: -1e4, highest: 1e4 })),
      u: v.optional(positive),
    }),
  ),
});

/** The sheet as it stands in a file, checked. */
export type SheetFile = v.InferOutput<typeof sheetFileSchema>;

/** An analyte as it stands in a file. */
export type AnalyteFile = v.InferOutput<typeof analyte>;
