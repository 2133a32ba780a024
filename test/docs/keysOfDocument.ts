/**
 * The keys of a JSON value as paths, "runs[].ending.code"; brackets stand for the entries of a list. Entries of lists
 * and values that are null in one place and an object in another give all their keys.
 */
export function keysOfDocument(value: unknown, path = ''): Set<string> {
  if (Array.isArray(value)) {
    const within = value.flatMap((entry) => [...keysOfDocument(entry, `${path}[]`)]);
    return new Set([`${path}[]`, ...within]);
  }
  if (typeof value !== 'object' || value === null) return new Set(path === '' ? [] : [path]);
  const within = Object.entries(value).flatMap(([key, inner]) => [
    ...keysOfDocument(inner, path === '' ? key : `${path}.${key}`),
  ]);
  return new Set(within);
}
