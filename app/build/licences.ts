import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import type { Plugin } from 'vite';

/** A package of which something stands in the build. */
interface UsedPackage {
  readonly name: string;
  readonly version: string;
  readonly license: string;
  readonly text: string;
}

/**
 * Writes the licences of all packages that are built into the page, its worker's included, beside the page. The texts
 * are asked for by those licences; the code itself is stripped of comments.
 *
 * @returns plugins for the page and for its worker; the worker is built first
 */
export function licences(fileName: string): { readonly page: Plugin; readonly worker: Plugin } {
  const folders = new Set<string>();
  const collect = (
    bundle: Readonly<Record<string, { readonly type: string; readonly moduleIds?: readonly string[] }>>,
  ) => {
    for (const { moduleIds } of Object.values(bundle)) {
      for (const id of moduleIds ?? []) {
        const folder = packageFolder(id.replace(/^\0/, '').replace(/\?.*$/, ''));
        if (folder !== null) folders.add(folder);
      }
    }
  };
  return {
    worker: { name: 'licences-of-worker', generateBundle: (_options, bundle) => collect(bundle) },
    page: {
      name: 'licences',
      apply: 'build',
      generateBundle(_options, bundle) {
        collect(bundle);
        this.emitFile({ type: 'asset', fileName, source: describeAll([...folders].map(readPackage)) });
      },
    },
  };
}

/** Folder of the package to which a module belongs; null for our own. */
function packageFolder(file: string): string | null {
  return /^.*\/node_modules\/(?:@[^/]+\/)?[^/]+/.exec(file)?.[0] ?? null;
}

function readPackage(folder: string): UsedPackage {
  const path = join(folder, 'package.json');
  if (!existsSync(path)) throw new Error(`${dirname(path)} has no package.json to read its licence from.`);
  const { name, version, license } = JSON.parse(readFileSync(path, 'utf8'));
  const texts = readdirSync(folder).filter((file) => /^(licen[cs]e|copying|notice)/i.test(file));
  return {
    name,
    version,
    license: typeof license === 'string' ? license : (license?.type ?? 'see the text'),
    text: texts.map((file) => readFileSync(join(folder, file), 'utf8').trim()).join('\n\n'),
  };
}

/** Packages that share a text stand together over it. */
function describeAll(packages: readonly UsedPackage[]): string {
  const heads = new Map<string, string[]>();
  for (const { name, version, license, text } of [...packages].sort((a, b) => (a.name < b.name ? -1 : 1)))
    heads.set(text, [...(heads.get(text) ?? []), `${name} ${version} (${license})`]);
  return [...heads]
    .map(([text, names]) => `${names.join('\n')}\n\n${text === '' ? 'No licence text comes with it.' : text}\n`)
    .join(`\n${'-'.repeat(80)}\n\n`);
}
