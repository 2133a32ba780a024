import { sheetFileSchema } from '../../core/sheet/sheetFile.ts';

/** The parts of a schema that are looked at, of whatever kind it is. */
interface SchemaParts {
  readonly type: string;
  readonly wrapped?: SchemaParts;
  readonly item?: SchemaParts;
  readonly entries?: Readonly<Record<string, SchemaParts>>;
  readonly options?: readonly string[];
  readonly pipe?: readonly SchemaParts[];
}

/** A key of a sheet that holds something else than further keys. */
export interface SheetKey {
  /** "sample.analytes[].pKa[]": brackets stand for the entries of a list. */
  readonly path: string;
  /** The words that may stand there, where only some may. */
  readonly options: readonly string[];
}

/** Every key that a sheet may have, from its schema. */
export function sheetKeys(): SheetKey[] {
  return keysOf(sheetFileSchema as unknown as SchemaParts, '');
}

function keysOf(schema: SchemaParts, path: string): SheetKey[] {
  if (schema.wrapped !== undefined) return keysOf(schema.wrapped, path);
  if (schema.type === 'strict_tuple') return [{ path: `${path}[]`, options: [] }];
  if (schema.item !== undefined) {
    const within = keysOf(schema.item, `${path}[]`);
    // A list of objects is told of itself, and then of the keys in it.
    return within.length === 1 && within[0].path === `${path}[]`
      ? within
      : [{ path: `${path}[]`, options: [] }, ...within];
  }
  const object = [schema, ...(schema.pipe ?? [])].find(({ entries }) => entries !== undefined);
  if (object?.entries === undefined) return [{ path, options: schema.options ?? [] }];
  return Object.entries(object.entries).flatMap(([key, inner]) => keysOf(inner, path === '' ? key : `${path}.${key}`));
}
