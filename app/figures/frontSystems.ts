import type { RunResult } from '../../core/index.ts';

/** Systems in front unless chosen otherwise: the analytes, or all where there is none. */
export function defaultFrontSystems(result: RunResult): ReadonlySet<string> {
  const systems = result.speciation?.systems ?? [];
  const analytes = systems.filter((system) => system.role === 'analyte');
  return new Set((analytes.length > 0 ? analytes : systems).map((system) => system.prefix));
}
