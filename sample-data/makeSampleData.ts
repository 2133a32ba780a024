import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { sampleFiles } from './sampleFiles.ts';

const folder = new URL('./', import.meta.url);
for (const [name, text] of sampleFiles()) {
  writeFileSync(fileURLToPath(new URL(name, folder)), text);
  console.log(`${name}: ${text.trimEnd().split('\n').length} lines`);
}
