import type { Run } from './run.ts';

/** Names runs after their file, and where it holds several after their label or their number as well. */
export function nameRuns(
  drafts: readonly (Omit<Run, 'name'> & { readonly label?: string })[],
  fileName: string,
): Run[] {
  const used = new Set<string>();
  return drafts.map(({ label, ...run }, index) => {
    const base = drafts.length === 1 ? fileName : `${fileName}: ${label ?? index + 1}`;
    let name = base;
    for (let copy = 2; used.has(name); copy++) name = `${base} (${copy})`;
    used.add(name);
    return { name, ...run };
  });
}
