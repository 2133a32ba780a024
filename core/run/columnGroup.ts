import type { PotentialUnit } from '../units/potential.ts';
import type { VolumeUnit } from '../units/volume.ts';
import type { ReadingKind } from './run.ts';

/** The columns of a table that make one run, or several told apart by a sample column. Columns count from 0. */
export interface ColumnGroup {
  readonly volume: number;
  readonly reading: number;
  readonly readingKind: ReadingKind;
  readonly volumeUnit: VolumeUnit;
  /** Unit of the readings where they are potentials. */
  readonly potentialUnit: PotentialUnit;
  readonly sample?: number;
  /** Label where a table holds several groups side by side. */
  readonly label?: string;
}
