import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { Locator, Page } from 'playwright-core';

/** A file as a person would hand it over. */
export interface GivenFile {
  readonly name: string;
  readonly content: string | Uint8Array;
}

/** A number of the results as it can be read on the page. */
export interface ShownQuantity {
  readonly value: number;
  readonly u: number;
}

const sampleData = fileURLToPath(new URL('../../sample-data/', import.meta.url));

/** A file of the sample data. */
export function sampleFile(name: string): GivenFile {
  return { name, content: readFileSync(`${sampleData}${name}`) };
}

/** The page in the words of an analyst. */
export class StepwellPage {
  readonly page: Page;

  constructor(page: Page) {
    this.page = page;
  }

  static async open(page: Page, address: string): Promise<StepwellPage> {
    await page.goto(address);
    const opened = new StepwellPage(page);
    await opened.isSettled();
    return opened;
  }

  /** Waits until nothing is being read or fitted and what is shown belongs to what was entered. */
  async isSettled(): Promise<void> {
    await this.page.locator('.findings[aria-busy="false"] .results').waitFor();
    await this.page.locator('.working').first().waitFor({ state: 'detached' });
  }

  /** Lets files fall onto the page. */
  async drop(...files: GivenFile[]): Promise<void> {
    const handed = files.map(({ name, content }) => ({
      name,
      bytes: [...(typeof content === 'string' ? new TextEncoder().encode(content) : content)],
    }));
    const transfer = await this.page.evaluateHandle((given) => {
      const data = new DataTransfer();
      for (const { name, bytes } of given) data.items.add(new File([new Uint8Array(bytes)], name));
      return data;
    }, handed);
    await this.page.dispatchEvent('main', 'dragenter', { dataTransfer: transfer });
    await this.page.dispatchEvent('main', 'drop', { dataTransfer: transfer });
    await transfer.dispose();
    await this.page.locator('.work-line').waitFor();
    await this.isSettled();
  }

  async openSample(title: RegExp): Promise<void> {
    await this.page.getByRole('button', { name: 'Samples' }).click();
    await this.page.getByRole('button', { name: title }).click();
    await this.isSettled();
  }

  /** A field of the conditions by what it is: "sample volume". */
  field(label: string): Locator {
    return this.page.getByRole('button', { name: new RegExp(`^${label}: `) });
  }

  /** Types a new value into a quantity of the conditions, by keyboard alone. */
  async changeValue(label: string, value: string): Promise<void> {
    await this.field(label).focus();
    await this.page.keyboard.press('Enter');
    await this.page.keyboard.type(value);
    await this.page.keyboard.press('Enter');
    await this.isSettled();
  }

  /** Value and uncertainty as the results print them. */
  async quantity(id: string): Promise<ShownQuantity> {
    const cells = this.page.locator(`tr[data-quantity="${id}"] td`);
    return { value: readNumber(await textOf(cells.nth(0))), u: readNumber(await textOf(cells.nth(1))) };
  }

  /** Code of how the work on the shown run ended. */
  async ending(): Promise<string | null> {
    return this.page.locator('.ending').getAttribute('data-ending');
  }

  /** What the page says was not accepted; empty where it says nothing. */
  async notAccepted(): Promise<string> {
    const note = this.page.getByRole('region', { name: 'Not accepted' });
    return (await note.count()) === 0 ? '' : textOf(note);
  }

  async undo(): Promise<void> {
    await this.page.getByRole('button', { name: 'Undo' }).click();
    await this.isSettled();
  }

  /** Pixels by which the page is wider than its window. */
  async overflow(): Promise<number> {
    return this.page.evaluate(() => {
      const { scrollWidth, clientWidth } = document.documentElement;
      return Math.max(0, scrollWidth - clientWidth);
    });
  }
}

/** All text of an element. */
export async function textOf(element: Locator): Promise<string> {
  return (await element.textContent()) ?? '';
}

/** A number as printed: with a minus sign and powers of ten. */
function readNumber(text: string): number {
  const plain = text
    .trim()
    .replace('−', '-')
    .replace(/ × 10(⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)/, (_, power: string) => `e${[...power].map(plainDigit).join('')}`);
  return plain === '' ? Number.NaN : Number(plain);
}

function plainDigit(raised: string): string {
  return raised === '⁻' ? '-' : String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(raised));
}
