import type { Rectangle } from './rectangle.ts';

/** Where the speciation stands: beside the curve on its pH axis, turned below it, or nowhere. */
export type Arrangement = 'beside' | 'below' | 'alone';

/** Where everything of the figure stands, px. */
export interface Panels {
  readonly arrangement: Arrangement;
  readonly width: number;
  readonly height: number;
  readonly curve: Rectangle;
  readonly residuals: Rectangle | null;
  readonly speciation: Rectangle | null;
  /** Where the cursor's numbers stand. */
  readonly readout: Rectangle;
  /** Left edges of the titles of the two vertical axes. */
  readonly titleLeft: number;
  readonly narrow: boolean;
}

/** What has to find room. */
export interface PanelNeeds {
  /** px */
  readonly width: number;
  readonly residuals: boolean;
  readonly speciation: boolean;
  /** Whether the pH needs an axis of its own at the right of the curve. */
  readonly pHAxis: boolean;
  /** Longest label of a constant, px. */
  readonly constantLabel: number;
  /** Rows of labels over the curve. */
  readonly labelRows: number;
}

/** Below this width, px, the panels stand under each other. */
const NARROW = 640;
/** Height of a row of labels, px. */
export const labelRow = 17;
/** Room for the numbers and the title of a horizontal axis, px. */
const AXIS_BELOW = 50;

export function panels(needs: PanelNeeds): Panels {
  return needs.width < NARROW ? stacked(needs) : sideBySide(needs);
}

function sideBySide(needs: PanelNeeds): Panels {
  const { width } = needs;
  const height = Math.round(clamp(0.43 * width, 480, 620));
  const left = 70;
  const top = 16 + labelRow * needs.labelRows;
  const residualHeight = needs.residuals ? Math.round(0.19 * height) : 0;
  const gapBelowCurve = needs.residuals ? 22 : 0;
  const curveHeight = height - top - AXIS_BELOW - residualHeight - gapBelowCurve;
  const pHRoom = needs.pHAxis ? 58 : 0;
  const right = needs.speciation ? needs.constantLabel + 12 : 24;
  const gap = needs.speciation ? 30 : 0;
  const free = width - left - pHRoom - gap - right;
  const speciationWidth = needs.speciation ? Math.round(clamp(0.31 * free, 190, 400)) : 0;
  const curve = { left, top, width: free - speciationWidth, height: curveHeight };
  const residuals = needs.residuals
    ? { left, top: top + curveHeight + gapBelowCurve, width: curve.width, height: residualHeight }
    : null;
  const speciation = needs.speciation
    ? { left: left + curve.width + pHRoom + gap, top, width: speciationWidth, height: curveHeight }
    : null;
  const shared = { width, curve, residuals, speciation, titleLeft: 14, narrow: false };
  if (speciation !== null && residuals !== null) {
    // The corner that the cross leaves free.
    const readoutTop = top + curveHeight + AXIS_BELOW + 6;
    const readout = {
      left: speciation.left,
      top: readoutTop,
      width: width - speciation.left,
      height: height - readoutTop,
    };
    return { ...shared, arrangement: 'beside', height, readout };
  }
  const readout = { left, top: height + 4, width: width - left - 24, height: 44 };
  const arrangement = speciation === null ? 'alone' : 'beside';
  return { ...shared, arrangement, height: height + 4 + readout.height, readout };
}

function stacked(needs: PanelNeeds): Panels {
  const { width } = needs;
  const left = 56;
  const right = needs.pHAxis ? 48 : 14;
  const top = 12 + labelRow * needs.labelRows;
  const panelWidth = width - left - right;
  const curve = { left, top, width: panelWidth, height: Math.round(clamp(0.8 * width, 270, 360)) };
  let edge = top + curve.height;
  const residuals = needs.residuals ? { left, top: edge + 16, width: panelWidth, height: 84 } : null;
  if (residuals !== null) edge = residuals.top + residuals.height;
  const readout = { left: 8, top: edge + AXIS_BELOW + 4, width: width - 16, height: 66 };
  edge = readout.top + readout.height;
  const shared = { width, curve, residuals, readout, titleLeft: 10, narrow: true };
  if (!needs.speciation) return { ...shared, arrangement: 'alone', height: edge, speciation: null };
  const labelsAbove = 34 + labelRow;
  const speciation = { left, top: edge + labelsAbove, width: panelWidth, height: 210 };
  return { ...shared, arrangement: 'below', height: speciation.top + speciation.height + AXIS_BELOW, speciation };
}

function clamp(value: number, low: number, high: number): number {
  return Math.max(low, Math.min(value, high));
}
