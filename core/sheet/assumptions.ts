/**
 * Every value that stands in for something the chemist left out, in one place.
 * Each is marked as assumed wherever it appears until somebody confirms it.
 */
export const assumptions = {
  /** A common aliquot; concentrations scale with it, so nothing is known of them until it is declared. */
  sampleVolume_mL: 25,
  extraWater_mL: 0,
  strongIon_M: 0,
  carbonate_M: 0,
  background_M: 0,
  /** The commonest nominal strength, but anything up to twice of it is usual: what the run itself says prevails. */
  titrantConcentration_M: 0.1,
  titrantConcentrationUncertainty_M: 0.05,
  strengthMeans: 'hydroxide',
  buretteGain: 1,
  /** Independent setting error of a 10–20 mL piston burette (common practice). */
  settingUncertainty_mL: 0.003,
  doseUncertainty_mL: 0,
  /**
   * Ratio of setting to reading error where neither is declared: 0.003 mL
   * against 0.005 in pH (common practice for an automatic titrator).
   */
  settingToReading_mL: 0.6,
  temperature_C: 25,
  activity: 'davies',
  scale: 'activity',
  /** A meter is no better than its buffers, and a pKa cannot be either. */
  offset: 0,
  offsetUncertainty: 0.02,
  slope: 1,
  /** A combined electrode reads about zero at pH 7; half a pH unit is allowed for. */
  pHAtZero: 7,
  pHAtZeroUncertainty: 0.5,
  chargeFullyProtonatedOfAcid: 0,
} as const;

/** Source shared by all runs whose electrode offset is assumed. */
export const assumedCalibration = 'calibration';

/** Source shared by all runs whose titrant strength is assumed: one bottle. */
export const assumedTitrant = 'strength of the titrant';
