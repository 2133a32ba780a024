import { existsSync } from 'node:fs';
import { cruise, format, type ICruiseResult } from 'dependency-cruiser';
import extractOptions from 'dependency-cruiser/config-utl/extract-depcruise-options';
import extractTSConfig from 'dependency-cruiser/config-utl/extract-ts-config';

/** Packages that one file alone may import, wherever that file stands; imports of types alone are free. */
const ONE_FILE_EACH = ['papaparse', 'plotly.js', 'ml-levenberg-marquardt'];

/** A file and what it imports. Where this is not seen, TypeScript was not read, and all walls stand by default. */
const KNOWN_IMPORT = ['core/run/run.ts', 'core/notice/refusal.ts'];

const folders = ['app', 'core', 'test', 'sample-data', 'vite.config.ts'].filter((path) => existsSync(path));
const options = await extractOptions('./.dependency-cruiser.mjs');
const tsConfig = extractTSConfig('./tsconfig.json');
const cruised = (await cruise(folders, options, undefined, { tsConfig })).output as ICruiseResult;
const imports = cruised.modules.flatMap(({ source, dependencies }) =>
  dependencies.map(({ resolved, dependencyTypes }) => ({ source, resolved, dependencyTypes })),
);
const problems: string[] = [];

if (!imports.some(({ source, resolved }) => source === KNOWN_IMPORT[0] && resolved === KNOWN_IMPORT[1])) {
  problems.push(`${KNOWN_IMPORT.join(' → ')} was not seen: the walls were not checked.`);
}
for (const name of ONE_FILE_EACH) {
  const users = imports
    .filter(({ source, resolved }) => /^(app|core)\//.test(source) && resolved.startsWith(`node_modules/${name}/`))
    .filter(({ dependencyTypes }) => !dependencyTypes.includes('type-only'))
    .map(({ source }) => source);
  const files = [...new Set(users)];
  if (files.length > 1) problems.push(`${name} may be imported by one file alone, not by ${files.join(' and ')}.`);
}

const report = await format(cruised, { outputType: 'err-long' });
console.log(`${String(report.output).trim()}\n`);
for (const problem of problems) console.error(problem);
process.exitCode = report.exitCode > 0 || problems.length > 0 ? 1 : 0;
