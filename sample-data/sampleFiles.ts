import { citricAcid } from './runs/citricAcid.ts';
import { newCompound } from './runs/newCompound.ts';
import { phthalate } from './runs/phthalate.ts';
import { strongAcid } from './runs/strongAcid.ts';
import { washingSoda } from './runs/washingSoda.ts';

/** Every file of the sample data by name: five exports, their sheets and the truth. The same on every machine. */
export function sampleFiles(): ReadonlyMap<string, string> {
  const runs = [newCompound(), citricAcid(), phthalate(), washingSoda(), strongAcid()];
  const json = (value: unknown) => `${JSON.stringify(value, null, 2)}\n`;
  const files = new Map<string, string>();
  for (const run of runs) {
    files.set(run.file, run.exported);
    files.set(run.file.replace(/\.\w+$/, '.sheet.json'), json(run.sheet));
  }
  files.set('truth.json', json(Object.fromEntries(runs.map((run) => [run.file, run.truth]))));
  return files;
}
