import type { RunResult } from '../../../core/index.ts';
import type { DeclaredField } from '../conditions/declaredFields.ts';

/** What quantities are called, by id; results may rest on conditions that are none, such as the scale of the readings. */
export function resultLabels(
  { quantities }: RunResult,
  declared: ReadonlyMap<string, DeclaredField>,
): ReadonlyMap<string, string> {
  return new Map([
    ...[...declared].map(([id, { label }]) => [id, label] as const),
    ...quantities.map(({ id, label }) => [id, label] as const),
  ]);
}
