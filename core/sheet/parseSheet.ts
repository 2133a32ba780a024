import * as v from 'valibot';
import type { Outcome } from '../notice/outcome.ts';
import type { Refusal } from '../notice/refusal.ts';
import { type SheetFile, sheetFileSchema, sheetVersion } from './sheetFile.ts';

/** A list longer than this helps nobody; the first refusals are mended first. */
const mostRefusals = 10;

/** Longest piece of the file that a message repeats, in characters. */
const longestQuote = 60;

/** Units that end a key, in the words of a remedy. */
const unitsOfKeys: Readonly<Record<string, string>> = { mL: 'mL', M: 'mol/L', C: '°C', mV: 'mV' };

/** Reads a sheet from JSON text. Every refusal names the key, what stands there and what may stand there. */
export function parseSheet(text: string, fileName: string): Outcome<SheetFile> {
  let json: unknown;
  try {
    // Some editors put a byte order mark before the text.
    json = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch (error) {
    return { ok: false, refusals: [notJson(text, fileName, error instanceof Error ? error.message : '')] };
  }
  const version = typeof json === 'object' && json !== null && 'sheet' in json ? json.sheet : undefined;
  if (version !== sheetVersion) return { ok: false, refusals: [otherVersion(version, fileName)] };
  const checked = v.safeParse(sheetFileSchema, json);
  if (checked.success) return { ok: true, value: checked.output };
  return { ok: false, refusals: checked.issues.slice(0, mostRefusals).map((issue) => explain(issue, fileName)) };
}

function notJson(text: string, file: string, reason: string): Refusal {
  const remedy = 'Mend the text there, or save the conditions again from the page.';
  if (text.trim() === '')
    return { code: 'sheet-not-json', message: `${file} is empty.`, remedy: 'Choose another sheet.', place: { file } };
  const position = /position (\d+)/.exec(reason);
  const line = position === null ? undefined : text.slice(0, Number(position[1])).split('\n').length;
  return {
    code: 'sheet-not-json',
    message: `${file} is not valid JSON${line === undefined ? '' : `, line ${line}`}: ${reason || 'it cannot be read'}.`,
    remedy,
    place: line === undefined ? { file } : { file, line },
  };
}

function otherVersion(version: unknown, file: string): Refusal {
  const place = { file, key: 'sheet' };
  return typeof version === 'number' && version > sheetVersion
    ? {
        code: 'sheet-version',
        message: `${file} is a sheet of version ${version}; this software reads up to version ${sheetVersion}.`,
        remedy: 'Open it with a newer version of this software.',
        place,
      }
    : {
        code: 'sheet-version',
        message: `${file} does not say that it is a sheet of version ${sheetVersion}.`,
        remedy: `Choose a sheet, or let this one begin with "sheet": ${sheetVersion}.`,
        place,
      };
}

function explain(issue: v.InferIssue<typeof sheetFileSchema>, file: string): Refusal {
  const key = issue.path?.map((item) => String(item.key)).join('.') ?? '';
  const place = { file, key };
  if (issue.type === 'strict_object')
    return issue.expected === 'never'
      ? { code: 'sheet-unknown-key', message: `The key "${key}" is not known.`, remedy: issue.message, place }
      : { code: 'sheet-wrong-type', message: `"${key}" is missing.`, remedy: issue.message, place };
  const outOfRange = issue.kind === 'validation' && typeof issue.input === 'number';
  return {
    code: outOfRange ? 'sheet-out-of-range' : 'sheet-wrong-type',
    message: `"${key}" is ${quote(issue.input)}, where ${issue.message} belongs.`,
    remedy: outOfRange ? remedyOfNumber(key) : remedyOfType(issue.input, issue.message),
    place,
  };
}

function remedyOfNumber(key: string): string {
  // The unit stands at the end of the key, or of the key around it: "volume_mL.value".
  const parts = key.split('.');
  const unit =
    parts.at(-1) === 'k'
      ? undefined
      : parts.map((part) => unitsOfKeys[part.split('_')[1] ?? '']).findLast((found) => found !== undefined);
  return unit === undefined ? 'Correct the number.' : `Correct the number; its unit is ${unit}.`;
}

function remedyOfType(input: unknown, expected: string): string {
  const number = typeof input === 'string' ? /^\s*([-+−]?\d+)(?:[.,](\d+))?(?:\s*[\p{L}°].*)?$/u.exec(input) : null;
  if (number === null || !/^a (whole )?number/.test(expected)) return `Write ${expected} there.`;
  const plain = number[1].replace('−', '-').replace('+', '') + (number[2] === undefined ? '' : `.${number[2]}`);
  return `Write the number alone, without quotes: ${plain}.`;
}

function quote(input: unknown): string {
  // JSON has no way to write a number beyond all doubles.
  const text = typeof input === 'number' ? String(input) : (JSON.stringify(input) ?? 'missing');
  return text.length > longestQuote ? `${text.slice(0, longestQuote - 1)}…` : text;
}
