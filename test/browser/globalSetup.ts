import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { chromium } from 'playwright-core';
import { preview } from 'vite';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  interface ProvidedContext {
    /** Where the running browser takes connections. */
    browserEndpoint: string;
    /** Address of the built page on a local server, ending in "/". */
    servedAddress: string;
    /** Address of the page built as one file, on file://. */
    singleFileAddress: string;
  }
}

const ROOT = fileURLToPath(new URL('../..', import.meta.url));

const BROWSER_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Builds both pages, serves one and starts one browser for all browser tests. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  await buildPages();
  const server = await preview({ root: ROOT, configFile: `${ROOT}vite.config.ts`, preview: { port: 0 } });
  const browser = await chromium.launchServer({
    executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
    args: BROWSER_FLAGS,
  });
  project.provide('browserEndpoint', browser.wsEndpoint());
  project.provide('servedAddress', server.resolvedUrls?.local[0] ?? '');
  project.provide('singleFileAddress', pathToFileURL(`${ROOT}dist/single/stepwell.html`).href);
  return async () => {
    await browser.close();
    await server.close();
  };
}

/** In a process of its own, because Vitest's NODE_ENV would put React's development code into the pages. */
async function buildPages(): Promise<void> {
  const { NODE_ENV: _ours, VITEST: _also, ...env } = process.env;
  const build = spawn('npm', ['run', '--silent', 'build'], { cwd: ROOT, env, stdio: 'inherit' });
  const [status] = await once(build, 'exit');
  if (status !== 0) throw new Error('The pages could not be built; the reason stands above.');
}
