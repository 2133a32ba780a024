import type { Outcome } from '../notice/outcome.ts';
import type { RefusalCode } from '../notice/refusal.ts';
import { foreignFormat } from './foreignFormat.ts';
import { maximumFileBytes } from './maximumFileBytes.ts';

export type TextEncodingName = 'UTF-8' | 'UTF-16LE' | 'UTF-16BE' | 'Windows-1252';

export interface DecodedText {
  /** The text without byte order mark; every line ends with a line feed, whatever the file used. */
  readonly text: string;
  readonly encoding: TextEncodingName;
  /** Whether neither a byte order mark nor valid UTF-8 decided, but the look of the bytes. */
  readonly guessed: boolean;
}

/**
 * Share of control characters above which a file is not text. Device logs hold
 * a stray one now and then; of random bytes about one in nine is one.
 */
const MAXIMUM_CONTROL_SHARE = 0.02;

/** Bytes looked at for the NUL pattern of UTF-16. */
const PATTERN_BYTES = 4096;

// Windows-1252 at 0x80–0x9F. Some runtimes decode these bytes as Latin-1, where they are control characters.
const WINDOWS_1252_C1 = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

/**
 * Bytes to text: UTF-8 with or without byte order mark, UTF-16 with one or by
 * the pattern of its NUL bytes, else Windows-1252, in which every byte stands
 * for something. `asked` is the encoding where a person has decided.
 *
 * Refuses with 'file-too-large', 'file-empty' or 'file-not-text'.
 */
export function decodeText(bytes: Uint8Array, asked?: TextEncodingName): Outcome<DecodedText> {
  if (bytes.length > maximumFileBytes) {
    return refuse(
      'file-too-large',
      `The file has ${(bytes.length / 1e6).toFixed(0)} MB; files up to ${maximumFileBytes / 1e6} MB are read.`,
      'Export the titration alone, or a part of it, to a file of its own.',
    );
  }
  const { encoding, raw } = asked === undefined ? decodeByEvidence(bytes) : decodeAs(bytes, asked);
  // The decoder drops a byte order mark itself; files glued together carry further ones inside.
  const text = normaliseLineEnds(raw.includes('\ufeff') ? raw.replaceAll('\ufeff', '') : raw);
  if (!/\S/.test(text)) {
    return refuse('file-empty', 'The file is empty.', 'Choose the file that holds volumes and readings.');
  }
  const foreign = foreignFormat(bytes);
  if (controlShare(text) > MAXIMUM_CONTROL_SHARE || (foreign !== undefined && text.includes('\u0000'))) {
    return refuse(
      'file-not-text',
      foreign === undefined ? 'The file is not text.' : `The file is not text but ${foreign.name}.`,
      foreign?.remedy ?? 'Export the titration as text, with volumes and readings in columns.',
    );
  }
  const marked = bytes[0] === 0xff || bytes[0] === 0xfe;
  return { ok: true, value: { text, encoding, guessed: asked === undefined && encoding !== 'UTF-8' && !marked } };
}

function refuse(code: RefusalCode, message: string, remedy: string): Outcome<never> {
  return { ok: false, refusals: [{ code, message, remedy, place: {} }] };
}

function decodeAs(
  bytes: Uint8Array,
  encoding: TextEncodingName,
): { readonly encoding: TextEncodingName; readonly raw: string } {
  if (encoding !== 'Windows-1252') return { encoding, raw: new TextDecoder(encoding.toLowerCase()).decode(bytes) };
  const latin = new TextDecoder('windows-1252').decode(bytes);
  const raw = latin.replace(/[\u0080-\u009f]/g, (character) => WINDOWS_1252_C1[character.charCodeAt(0) - 0x80]);
  return { encoding, raw };
}

function decodeByEvidence(bytes: Uint8Array): { readonly encoding: TextEncodingName; readonly raw: string } {
  const wide = utf16Of(bytes);
  if (wide !== undefined) return decodeAs(bytes, wide);
  const raw = asUtf8(bytes);
  if (raw !== undefined) return { encoding: 'UTF-8', raw };
  return decodeAs(bytes, 'Windows-1252');
}

function utf16Of(bytes: Uint8Array): 'UTF-16LE' | 'UTF-16BE' | undefined {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'UTF-16LE';
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'UTF-16BE';
  const looked = Math.min(bytes.length, PATTERN_BYTES) & ~1;
  let evenNuls = 0;
  let oddNuls = 0;
  for (let index = 0; index < looked; index += 2) {
    if (bytes[index] === 0) evenNuls += 1;
    if (bytes[index + 1] === 0) oddNuls += 1;
  }
  // Figures and delimiters are Latin: in UTF-16 nearly every second byte of an export is NUL, and the others never are.
  const mostly = looked / 2 / 2;
  const hardly = looked / 2 / 50;
  if (oddNuls > mostly && evenNuls <= hardly) return 'UTF-16LE';
  if (evenNuls > mostly && oddNuls <= hardly) return 'UTF-16BE';
  return undefined;
}

function asUtf8(bytes: Uint8Array): string | undefined {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return undefined;
  }
}

function normaliseLineEnds(text: string): string {
  return text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text;
}

function controlShare(text: string): number {
  let controls = 0;
  for (let index = 0; index < text.length; index++) {
    const code = text.charCodeAt(index);
    // Tab to line feed and form feed are layout; 0x1A ends files of old loggers; 0xFFFD is a byte that decoded to nothing.
    const layout = (code >= 0x09 && code <= 0x0d) || code === 0x1a;
    if ((code < 0x20 && !layout) || (code >= 0x7f && code <= 0x9f) || code === 0xfffd) controls += 1;
  }
  return controls / text.length;
}
