import type { Doubt } from '../notice/doubt.ts';
import type { ReadingKind, Run } from '../run/run.ts';
import type { Sheet } from '../sheet/sheet.ts';

/**
 * Everything that is known about one run after it has been worked up: plain
 * data that can be cloned between threads and written as JSON. A number that
 * is missing is null; there is no NaN anywhere in it.
 */
export interface RunResult {
  readonly run: Run;
  /** The complete sheet, with what was assumed marked so. */
  readonly sheet: Sheet;
  readonly ending: RunEnding;
  /** Every quantity of the run, in the order of the sheet. */
  readonly quantities: readonly QuantityResult[];
  readonly equivalence: readonly EquivalenceResult[];
  /** Null where nothing was fitted. */
  readonly noise: NoiseResult | null;
  readonly doubts: readonly Doubt[];
  /** How many groups the run shows; null where that could not be asked. */
  readonly ladder: LadderResult | null;
  /** Correlation of the fitted and known quantities; empty where nothing was fitted. */
  readonly correlation: CorrelationResult;
  /** The fitted (or, where all is fixed, predicted) curve; null where none could be computed. */
  readonly curve: CurveResult | null;
  /** One entry per row of the run, in its order. */
  readonly points: readonly PointResult[];
  /** Null where there is no curve or no proton system. */
  readonly speciation: SpeciationResult | null;
  /** The fit with wild points set aside; null where there is none. Nothing above rests on it. */
  readonly robust: RobustResult | null;
}

/** How the work on a run ended. Codes that begin with "fitted" are successes. */
export type RunEndingCode =
  | 'fitted'
  /** Every quantity was fixed: the curve was computed and compared, nothing was fitted. */
  | 'predicted'
  | 'too-few-points'
  | 'volumes-run-backwards'
  | 'all-rows-excluded'
  | 'flat-readings'
  | 'no-solution'
  | 'not-converged'
  | 'stopped';

export interface RunEnding {
  readonly code: RunEndingCode;
  /** One or two plain sentences; for a failure: why, and what would help. */
  readonly message: string;
}

/** Why a quantity has no uncertainty, or no value. */
export type WhyNoU =
  /** Declared as a plain number. */
  | 'fixed'
  /** The data do not determine it. */
  | 'undetermined'
  /** Only one side of it is determined; see the interval. */
  | 'bound'
  /** The run was not fitted. */
  | 'not-fitted'
  /** No degree of freedom is left to estimate the noise from. */
  | 'no-degrees-of-freedom';

export interface QuantityResult {
  readonly id: string;
  readonly label: string;
  /** "mol/L", "mL", "mV", "L/mol" or "" for a pure number. */
  readonly unit: string;
  /** `assumed` stands for a fixed or known value that nobody has confirmed. */
  readonly state: 'fixed' | 'known' | 'fitted' | 'assumed';
  readonly value: number | null;
  /** Standard uncertainty. */
  readonly u: number | null;
  /** 95 % interval; either end is null for a bound. Null where there is no uncertainty. */
  readonly interval95: readonly [number | null, number | null] | null;
  readonly whyNoU: WhyNoU | null;
  /** Ids of assumed quantities on which the value rests noticeably. */
  readonly restsOn: readonly string[];
  /** Where its variance comes from, largest part first; the shares add up to one. Empty where there is no uncertainty. */
  readonly shares: readonly ShareResult[];
  /** Rise of the cost along the profile of this quantity; empty where none was taken. */
  readonly profile: readonly ProfilePointResult[];
  /** For a pKa of the run's own substances: what it is, and the other two kinds of constant. */
  readonly constant: ConstantResult | null;
}

/** A part of the variance of a result. */
export interface ShareResult {
  /** "reading noise", "setting error", "dosing error", or the source or quantity whose declared uncertainty it is. */
  readonly source: string;
  readonly share: number;
}

/** A quantity held at a value, with everything else fitted anew. */
export interface ProfilePointResult {
  readonly value: number;
  /** Rise of the weighted sum of squares above its minimum. */
  readonly rise: number;
}

/** The three kinds of acidity constant at the temperature and ionic strength of the run. */
export interface ConstantResult {
  /** What `value` is. */
  readonly kind: 'thermodynamic' | 'concentration' | 'mixed';
  readonly temperature_C: number;
  /** mol/L where this group is half deprotonated. */
  readonly ionicStrength_M: number;
  /** Null without an activity model. */
  readonly thermodynamic: number | null;
  readonly concentration: number | null;
  readonly mixed: number | null;
}

export interface EquivalenceResult {
  /** Name of the analyte, or "strong acid" / "strong base". */
  readonly analyte: string;
  /** Number of the step within its analyte, in the order of the titration, from 1; 0 for an excess of strong acid or base. */
  readonly step: number;
  readonly volume_mL: number | null;
  readonly u: number | null;
  readonly by: 'fit' | 'derivative' | 'gran';
  /** Where the variance of a fitted volume comes from; empty for the others. */
  readonly shares: readonly ShareResult[];
  /** How the volume is meant: form of carbonate counted, range of points used. */
  readonly remark: string;
}

export interface NoiseResult {
  /** Standard uncertainty of a reading, in `unit`. */
  readonly reading: number;
  readonly setting_mL: number;
  readonly dose_mL: number;
  readonly unit: ReadingKind;
  /** True where the reading noise was declared, false where it was estimated from the run. */
  readonly declared: boolean;
  /** Null where there is no degree of freedom. */
  readonly reducedChiSquare: number | null;
  /** What the data leave after what they determined; not always a whole number. */
  readonly degreesOfFreedom: number;
}

/** The run with other numbers of groups, and with what else may explain it, all on one noise. */
export interface LadderResult {
  /** In order of groups; of equal ones, what keeps to the sheet comes first. */
  readonly rungs: readonly LadderRungResult[];
  /** Position of the rung that the run shows. */
  readonly chosen: number;
  /** Groups of that rung. */
  readonly groups: number;
  /** Groups that the sheet declares; null where it leaves them open. */
  readonly declared: number | null;
  /** The answer in a few sentences. */
  readonly sentence: string;
}

export interface LadderRungResult {
  readonly groups: number;
  /** Whether carbonate was fitted, of a base titrant or else of the sample. */
  readonly carbonate: boolean;
  /** Whether strong acid or base in the sample was fitted; without any group it always is. */
  readonly excess: boolean;
  /** Sum of squared whitened residuals on the noise common to all rungs; null where the rung could not be fitted. */
  readonly cost: number | null;
  /** Number of fitted quantities. */
  readonly parameters: number;
  readonly aicc: number | null;
  /** Share of the evidence, 0–1; the weights of all rungs add up to one. */
  readonly weight: number;
  /** Root mean square of the residuals, in the unit of the reading. */
  readonly residual: number | null;
  /** The same in units of the common noise. */
  readonly weightedResidual: number | null;
  /** Constants of the counted groups; null where the rung could not be fitted. */
  readonly pKa: readonly (number | null)[];
  /** What speaks against it, in words; empty where nothing does. */
  readonly againstIt: readonly string[];
  /** F test against a rung contained in it, by its position; null where none is, or nothing can be said. */
  readonly test: { readonly against: number; readonly F: number; readonly p: number } | null;
}

/** What a fit says in which points far from the curve count less or nothing. */
export interface RobustResult {
  /** Points that it does not believe. They are used all the same, unless somebody excludes them. */
  readonly distrusted: readonly {
    /** Line of the source file. */
    readonly line: number;
    readonly volume_mL: number;
    /** 0 for a point that counts nothing there, up to 1. */
    readonly weight: number;
  }[];
  /** How far each fitted quantity would move. */
  readonly moves: readonly {
    readonly id: string;
    /** In the unit of the quantity. */
    readonly shift: number;
    /** In its standard uncertainties. */
    readonly inU: number;
  }[];
}

export interface CorrelationResult {
  readonly ids: readonly string[];
  /** Row by row, ids × ids; null where a quantity is not determined. */
  readonly matrix: readonly (number | null)[];
}

/** The curve on a grid dense enough to draw, in order of rising volume. */
export interface CurveResult {
  readonly volume_mL: Float64Array;
  /** In the unit of the run. */
  readonly reading: Float64Array;
  /** The pH that the reading means on the run's scale. */
  readonly pH: Float64Array;
  readonly ionicStrength_M: Float64Array;
}

export interface PointResult {
  readonly line: number;
  readonly volume_mL: number;
  readonly reading: number;
  /** The pH that the reading means; equal to the reading where the electrode is ideal. */
  readonly pH: number;
  readonly used: boolean;
  /** Reading minus curve, in the unit of the run; null where there is no curve. */
  readonly residual: number | null;
  /** Standard uncertainty that the point carries in the fit, in the unit of the run. */
  readonly u: number | null;
}

export interface SpeciationResult {
  /** pH grid on the run's own scale, rising. */
  readonly pH: Float64Array;
  readonly systems: readonly {
    readonly name: string;
    /** Id prefix of its quantities: "" for the first analyte. */
    readonly prefix: string;
    readonly role: 'analyte' | 'counterIon' | 'carbonate' | 'titrant';
    /** From the fully protonated form on. */
    readonly forms: readonly {
      readonly charge: number;
      readonly protons: number;
      /** Share of this form at every pH of the grid, 0–1. */
      readonly fraction: Float64Array;
    }[];
    /** Constants on the plotted scale, where neighbouring forms are equal. */
    readonly crossings: readonly { readonly quantityId: string; readonly group: number; readonly pH: number }[];
    /** pH of zero mean charge; null where the charge never crosses zero. */
    readonly isoelectricPoint: number | null;
  }[];
}
