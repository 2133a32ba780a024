import { readFile } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { fileURLToPath } from 'node:url';
import type { Page } from 'playwright-core';
import { afterEach, beforeEach, expect, inject } from 'vitest';
import { browserTest } from './browserTest.ts';

/** The ways out that are tried; each asks the listener for a path of its own name. */
const WAYS_OUT = ['beacon', 'fetch', 'image', 'script', 'socket', 'worker', 'xhr'];

/** The built page without its policy, from the listener itself. */
const CONTROL = 'control.html';

let listener: Server;
let outside: string;
let arrived: Set<string>;

beforeEach(async () => {
  arrived = new Set();
  const built = await readFile(fileURLToPath(inject('singleFileAddress')), 'utf8');
  const bare = built.replace(/<meta http-equiv="Content-Security-Policy"[^>]*>/, '');
  expect(bare).not.toBe(built);
  const note = (path = '') => arrived.add(path.slice(1));
  listener = createServer((request, response) => {
    note(request.url);
    const isControl = request.url === `/${CONTROL}`;
    response.writeHead(200, {
      'access-control-allow-origin': '*',
      'content-type': isControl ? 'text/html' : 'text/javascript',
    });
    response.end(isControl ? bare : '');
  });
  listener.on('upgrade', (request, socket) => {
    note(request.url);
    socket.destroy();
  });
  await new Promise<void>((listening) => listener.listen(0, '127.0.0.1', listening));
  outside = `127.0.0.1:${(listener.address() as AddressInfo).port}`;
});

afterEach(async () => {
  listener.closeAllConnections();
  await new Promise((closed) => listener.close(closed));
});

/** Tries every way out of the page and waits until each has ended, one way or the other. */
async function tryEveryWayOut(page: Page): Promise<void> {
  await page.evaluate(async (host) => {
    const ended = (start: (done: () => void) => void) => new Promise<void>((done) => start(done));
    const http = `http://${host}`;
    navigator.sendBeacon(`${http}/beacon`);
    await Promise.all([
      fetch(`${http}/fetch`).catch(() => undefined),
      ended((done) => {
        const request = new XMLHttpRequest();
        request.onloadend = done;
        request.open('GET', `${http}/xhr`);
        request.send();
      }),
      ended((done) => {
        const image = new Image();
        image.onload = done;
        image.onerror = done;
        image.src = `${http}/image`;
      }),
      ended((done) => {
        const script = document.createElement('script');
        script.onload = done;
        script.onerror = done;
        script.src = `${http}/script`;
        document.head.append(script);
      }),
      ended((done) => {
        // A refused socket stays silent itself; the document hears of it.
        document.addEventListener('securitypolicyviolation', (refused) => {
          if (refused.blockedURI.startsWith('ws')) done();
        });
        new WebSocket(`ws://${host}/socket`).onclose = done;
      }),
      ended((done) => {
        const code = `fetch('${http}/worker').catch(() => undefined).then(() => postMessage('done'))`;
        const worker = new Worker(URL.createObjectURL(new Blob([code])));
        worker.onmessage = done;
        worker.onerror = done;
      }),
    ]);
  }, outside);
  // A beacon does not say when it has ended: it gets many times what the others take.
  await page.waitForTimeout(300);
}

for (const build of ['singleFileAddress', 'servedAddress'] as const) {
  browserTest(`nothing gets out of the built page (${build})`, async ({ context }) => {
    const page = await context.newPage();
    await page.goto(inject(build));
    await tryEveryWayOut(page);
    expect([...arrived]).toEqual([]);
  });
}

browserTest('the same attempts arrive from the same page without its policy', async ({ context }) => {
  const page = await context.newPage();
  await page.goto(`http://${outside}/${CONTROL}`);
  arrived.clear();
  await tryEveryWayOut(page);
  // What was sent last may still be under way.
  await expect.poll(() => [...arrived].sort(), { timeout: 20_000 }).toEqual(WAYS_OUT);
});
