import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const top = fileURLToPath(new URL('../../..', import.meta.url));

export interface Finished {
  readonly status: number | null;
  readonly output: string;
  readonly errors: string;
}

/** Where the command is started and what npm would tell it; `INIT_CWD` is where the user stood. */
export interface Standing {
  readonly cwd?: string;
  readonly initCwd?: string;
}

/** Runs the terminal command as a process of its own. */
export function fitCommand(words: readonly string[], standing: Standing = {}): Promise<Finished> {
  const { INIT_CWD: _, ...environment } = process.env;
  const child = spawn(process.execPath, [`${top}app/terminal/launch.mjs`, `${top}app/terminal/fit.ts`, ...words], {
    cwd: standing.cwd ?? top,
    env: standing.initCwd === undefined ? environment : { ...environment, INIT_CWD: standing.initCwd },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  return new Promise((resolve, reject) => {
    let output = '';
    let errors = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      output += text;
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => {
      errors += text;
    });
    child.on('error', reject);
    child.on('close', (status) => resolve({ status, output, errors }));
  });
}
