/** A call of the command, understood. */
export interface Call {
  readonly ok: true;
  readonly files: readonly string[];
  /** Null: everything is assumed. */
  readonly sheet: string | null;
  readonly json: boolean;
}

export interface WrongCall {
  readonly ok: false;
  readonly message: string;
}

export const usage = 'usage: npm run --silent fit -- FILE… [--sheet SHEET.json] [--json]';

/** Reads the words of a call; a word that is not understood makes it wrong. */
export function parseArguments(words: readonly string[]): Call | WrongCall {
  const files: string[] = [];
  let sheet: string | null = null;
  let json = false;
  let onlyFiles = false;
  for (let i = 0; i < words.length; i++) {
    const word = words[i];
    if (onlyFiles || !word.startsWith('-')) files.push(word);
    else if (word === '--') onlyFiles = true;
    else if (word === '--json') json = true;
    else if (word === '--sheet') {
      if (sheet !== null) return wrong('--sheet is given twice; one sheet serves every run of a call.');
      i++;
      if (i >= words.length || words[i].startsWith('--')) return wrong('--sheet needs the name of a file.');
      sheet = words[i];
    } else return wrong(`${word} is not an option.`);
  }
  return files.length === 0 ? wrong('No file is named.') : { ok: true, files, sheet, json };
}

function wrong(message: string): WrongCall {
  return { ok: false, message: `${message}\n${usage}` };
}
