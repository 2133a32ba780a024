// Runs a TypeScript entry without a build step: `node app/terminal/launch.mjs ENTRY.ts [ARGUMENT…]`.
import { mkdirSync, rmSync } from 'node:fs';
import { isAbsolute, resolve } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'rolldown';

const cache = fileURLToPath(new URL('../../node_modules/.cache', import.meta.url));
const bundle = resolve(cache, `launch-${process.pid}.mjs`);
const entry = resolve(process.argv[2]);
// The bundle deletes itself once it is in memory, so that none is left behind however the process ends.
const banner = `import { rmSync as forget } from 'node:fs'; forget(${JSON.stringify(bundle)});`;
// A module that asks where it stands gets the address of its source, not of the bundle.
const ownAddress = {
  name: 'own-address',
  transform: (code, id) =>
    code.includes('import.meta.url')
      ? { code: code.replaceAll('import.meta.url', JSON.stringify(pathToFileURL(id).href)), map: null }
      : null,
};

process.argv.splice(1, 2, entry);
process.setSourceMapsEnabled(true);
process.on('exit', () => rmSync(bundle, { force: true }));
mkdirSync(cache, { recursive: true });
try {
  await build({
    input: entry,
    platform: 'node',
    external: (id) => !id.startsWith('.') && !isAbsolute(id),
    plugins: [ownAddress],
    output: { file: bundle, banner, sourcemap: 'inline', codeSplitting: false },
  });
} catch (error) {
  console.error(error.message);
  process.exit(2);
}
await import(pathToFileURL(bundle).href);
