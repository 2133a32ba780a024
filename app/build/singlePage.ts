import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import type { Plugin } from 'vite';

/**
 * Makes the page fit for opening from disk as one file: its icon moves inside, the manifest (an error on file://)
 * goes, and the file gets a name that says what it is.
 */
export function singlePage(fileName: string): Plugin {
  let publicFolder = '';
  return {
    name: 'single-page',
    apply: 'build',
    enforce: 'post',
    configResolved(config) {
      publicFolder = config.publicDir;
    },
    transformIndexHtml: {
      order: 'post',
      handler(page) {
        const icon = readFileSync(resolve(publicFolder, 'icon.svg')).toString('base64');
        return page
          .replace(/\s*<link rel="manifest"[^>]*>/, '')
          .replace(/(<link rel="icon"[^>]*href=")[^"]*"/, `$1data:image/svg+xml;base64,${icon}"`);
      },
    },
    generateBundle: {
      order: 'post',
      handler(_options, bundle) {
        const pages = Object.values(bundle).filter((file) => file.fileName.endsWith('.html'));
        if (pages.length !== 1) throw new Error(`One page was expected, ${pages.length} were built.`);
        pages[0].fileName = fileName;
      },
    },
  };
}
