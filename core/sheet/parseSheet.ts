import * as v from 'valibot';
import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { type SheetFile, sheetFileSchema, sheetVersion } from './sheetFile.ts';

/** A list longer than this helps nobody; the first refusals are mended first. */
const mostRefusals = 10;

type Issue = v.InferIssue<typeof sheetFileSchema>;

/** Reads a sheet from JSON text. Every refusal names the key and what may stand there. */
export function parseSheet(text: string, fileName: string): Outcome<SheetFile> {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    return refused([
      {
        code: 'sheet-not-json',
        message: `${fileName} is not valid JSON: ${error instanceof Error ? error.message : 'it cannot be read'}.`,
        remedy: 'Mend the text at that place, or save the conditions again from the page.',
        place: { file: fileName },
      },
    ]);
  }
  const version = typeof json === 'object' && json !== null && 'sheet' in json ? json.sheet : undefined;
  if (version !== sheetVersion) {
    const newer = typeof version === 'number' && version > sheetVersion;
    return refused([
      {
        code: 'sheet-version',
        message: newer
          ? `${fileName} is a sheet of version ${version}; this software reads up to version ${sheetVersion}.`
          : `${fileName} does not say that it is a sheet of version ${sheetVersion}.`,
        remedy: newer
          ? 'Open it with a newer version of this software.'
          : `Begin the sheet with "sheet": ${sheetVersion}.`,
        place: { file: fileName, key: 'sheet' },
      },
    ]);
  }
  const checked = v.safeParse(sheetFileSchema, json);
  if (checked.success) return { ok: true, value: checked.output };
  return refused(checked.issues.slice(0, mostRefusals).map((issue) => explain(issue, fileName)));
}

function refused(refusals: readonly Refusal[]): Outcome<SheetFile> {
  return { ok: false, refusals };
}

/** The issue that lies deepest: in a choice of forms, the form that came furthest says best what is wrong. */
function deepest(issue: Issue | v.BaseIssue<unknown>): v.BaseIssue<unknown> {
  const inner = issue.issues ?? [];
  let best: v.BaseIssue<unknown> = issue;
  for (const candidate of inner) {
    const found = deepest(candidate);
    const depth = found.path?.length ?? 0;
    if (depth > 0 && found.type !== 'literal') best = best === issue || depth > (best.path?.length ?? 0) ? found : best;
  }
  return best;
}

function explain(issue: Issue, file: string): Refusal {
  const outer = issue.path?.map((item) => String(item.key)) ?? [];
  const inner = deepest(issue);
  const isInner = inner !== issue;
  const path = isInner ? [...outer, ...(inner.path?.map((item) => String(item.key)) ?? [])] : outer;
  const key = path.join('.');
  if (inner.type === 'strict_object' && inner.expected === 'never') {
    return {
      code: 'sheet-unknown-key',
      message: `The key "${key}" is not known in a sheet.`,
      remedy: 'Correct its spelling or take it out; a key that is not understood is never passed over.',
      place: { file, key },
    };
  }
  const found = describe(inner.input);
  const numeric = typeof inner.input === 'number' && inner.type !== 'picklist' && inner.type !== 'literal';
  return {
    code: numeric ? 'sheet-out-of-range' : 'sheet-wrong-type',
    message: `"${key}" is ${found}, which cannot stand there.`,
    remedy: `Give ${isInner && inner.kind === 'schema' && inner.type === 'union' ? issue.message : inner.message} for "${key}".`,
    place: { file, key },
  };
}

function describe(input: unknown): string {
  const text = JSON.stringify(input) ?? 'missing';
  return text.length > 60 ? `${text.slice(0, 57)}…` : text;
}
