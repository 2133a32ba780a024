import type { Refusal } from '../../core/index.ts';

export interface RefusalGroup {
  readonly first: Refusal;
  /** Lines of the file in which the same happened, the first included. */
  readonly lines: readonly number[];
  readonly count: number;
}

/** Puts refusals of the same kind with the same remedy together, in the order in which each kind comes first. */
export function groupRefusals(refusals: readonly Refusal[]): readonly RefusalGroup[] {
  const groups = new Map<string, Refusal[]>();
  for (const refusal of refusals) {
    const { code, remedy, place } = refusal;
    // Keys of a sheet each need their own mending; lines of a table mostly share it.
    const kind = JSON.stringify([
      code,
      remedy,
      place.file ?? '',
      place.line === undefined ? (place.key ?? '') : 'line',
    ]);
    const group = groups.get(kind);
    if (group === undefined) groups.set(kind, [refusal]);
    else group.push(refusal);
  }
  return [...groups.values()].map((members) => ({
    first: members[0],
    lines: members.flatMap(({ place }) => (place.line === undefined ? [] : [place.line])),
    count: members.length,
  }));
}
