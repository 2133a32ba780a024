import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { expect, inject, test } from 'vitest';

/** What a page did that the person before it did not ask for. */
interface Traffic {
  /** Console messages and uncaught errors, of workers too. */
  readonly messages: string[];
  /** Addresses that were asked for, beside the page's own file or server, and windows that were opened. */
  readonly outside: string[];
}

/**
 * A Vitest test with a browser: `context` is fresh for each test; `page` is an empty page in it, and the test fails
 * if that page wrote anything to the console or asked for anything outside its own file or server.
 */
export const browserTest = test.extend<{ browser: Browser; context: BrowserContext; page: Page }>({
  browser: [
    // biome-ignore lint/correctness/noEmptyPattern: Vitest reads a fixture's needs from this pattern
    async ({}, use) => {
      const browser = await chromium.connect(inject('browserEndpoint'));
      await use(browser);
      await browser.close();
    },
    { scope: 'file' },
  ],
  context: async ({ browser }, use) => {
    const context = await browser.newContext();
    await use(context);
    await context.close();
  },
  page: async ({ context }, use) => {
    const page = await context.newPage();
    const traffic = watch(context, page);
    await use(page);
    expect(traffic).toEqual({ messages: [], outside: [] });
  },
});

function watch(context: BrowserContext, page: Page): Traffic {
  const traffic: Traffic = { messages: [], outside: [] };
  context.on('console', (message) => traffic.messages.push(`${message.type()}: ${message.text()}`));
  context.on('weberror', (failure) => traffic.messages.push(`uncaught: ${failure.error().message}`));
  context.on('page', (opened) => traffic.outside.push(`window: ${opened.url()}`));
  page.on('websocket', (socket) => traffic.outside.push(socket.url()));
  context.on('request', (request) => {
    if (!isOwn(request.url())) traffic.outside.push(request.url());
  });
  return traffic;
}

function isOwn(address: string): boolean {
  return (
    address.startsWith(inject('servedAddress')) ||
    address === inject('singleFileAddress') ||
    /^(blob|data):/.test(address)
  );
}
