import type { PotentialUnit } from '../units/potential.ts';
import type { ExportUnit } from '../units/readUnit.ts';
import type { VolumeUnit } from '../units/volume.ts';
import type { VolumeMeaning } from './readingChoices.ts';
import type { ReadingKind } from './run.ts';

/** The columns of a table that make one run, or several told apart by a sample column. Columns count from 0. */
export interface ColumnGroup {
  readonly volume: number;
  readonly reading: number;
  readonly readingKind: ReadingKind;
  readonly volumeUnit: VolumeUnit;
  /** Unit of the readings where they are potentials. */
  readonly potentialUnit: PotentialUnit;
  /** Whether header, units row, cells or a person name the unit. */
  readonly volumeUnitGiven: boolean;
  readonly readingUnitGiven: boolean;
  /** Whether a person has decided the unit, against what stands in cells. */
  readonly volumeUnitDecided: boolean;
  readonly readingUnitDecided: boolean;
  readonly volumeMeaning: VolumeMeaning;
  /** Whether the meaning of the volumes rests on how their figures behave. */
  readonly meaningGuessed: boolean;
  readonly temperature?: number;
  readonly temperatureUnit?: ExportUnit;
  readonly time?: number;
  readonly timeUnit?: ExportUnit;
  readonly sample?: number;
  /** Label where a table holds several groups side by side. */
  readonly label?: string;
}
