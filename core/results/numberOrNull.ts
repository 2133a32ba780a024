/** A number that may be printed, or null: nothing that is not finite leaves the core. */
export function numberOrNull(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}
