import { nominalValue } from '../core/model/quantity.ts';
import { designRun, type RunDesign } from '../core/model/runDesign.ts';
import { RunModel } from '../core/model/runModel.ts';
import { completeSheet } from '../core/sheet/completeSheet.ts';
import type { RunFacts } from '../core/sheet/runFacts.ts';
import type { SheetFile } from '../core/sheet/sheetFile.ts';

/** The model of a sheet that declares every number it needs, and the values it declares. */
export interface SheetModel {
  readonly design: RunDesign;
  /** One per quantity of the design; NaN where a sheet gives a fitted quantity no start. */
  readonly values: Float64Array;
  readonly model: RunModel;
}

/** What a sheet may leave to the run; the sheets of tests declare all of it. */
export const plainFacts: RunFacts = { readingKind: 'pH', titrantKind: 'base', groupsIfOpen: 1 };

/** Goes from a sheet to the model of a run with burette readings in mL. */
export function modelOfSheet(sheet: SheetFile, volumes_mL: ArrayLike<number>): SheetModel {
  const complete = completeSheet(sheet, plainFacts);
  if (!complete.ok) throw new Error(JSON.stringify(complete.refusals));
  const design = designRun(complete.value);
  const values = Float64Array.from(design.quantities, (quantity) => nominalValue(quantity) ?? Number.NaN);
  return { design, values, model: new RunModel(design, Float64Array.from(volumes_mL), null) };
}

/** The readings that a sheet predicts, pH or mV. */
export function readingsOfSheet(sheet: SheetFile, volumes_mL: ArrayLike<number>): Float64Array {
  const { model, values } = modelOfSheet(sheet, volumes_mL);
  const readings = new Float64Array(volumes_mL.length);
  if (!model.predict(values, readings)) throw new Error('this sheet describes no mixture');
  return readings;
}
