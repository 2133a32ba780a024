export type KeyPath = readonly (string | number)[];

/**
 * A copy of plain data with one value replaced; `undefined` takes the key out. Objects and lists on the way are made
 * where they are missing; objects left empty by taking out are taken out too.
 */
export function setAtPath<Data>(data: Data, path: KeyPath, value: unknown): Data {
  return set(data, path, value) as Data;
}

/** The value at a path; undefined where any part of the way is missing. */
export function getAtPath(data: unknown, path: KeyPath): unknown {
  let found = data;
  for (const key of path) {
    if (typeof found !== 'object' || found === null) return undefined;
    found = (found as Record<string | number, unknown>)[key];
  }
  return found;
}

function set(data: unknown, [key, ...rest]: KeyPath, value: unknown): unknown {
  if (key === undefined) return value;
  if (typeof key === 'number') {
    const list = Array.isArray(data) ? [...data] : [];
    while (list.length <= key) list.push({});
    list[key] = set(list[key], rest, value) ?? {};
    return list;
  }
  const { [key]: before, ...others } = (typeof data === 'object' && data !== null ? data : {}) as Record<
    string,
    unknown
  >;
  const after = set(before, rest, value);
  if (after === undefined || (rest.length > 0 && isEmptyObject(after))) return others;
  // Keys keep their place, so that a saved sheet reads in its usual order.
  return before === undefined ? { ...others, [key]: after } : { ...(data as object), [key]: after };
}

function isEmptyObject(value: unknown): boolean {
  return typeof value === 'object' && value !== null && !Array.isArray(value) && Object.keys(value).length === 0;
}
