import { readFileSync } from 'node:fs';

/** The texts of a union of texts, read from its source: types leave nothing behind that could be asked. */
export function unionMembers(file: URL, name: string): string[] {
  const source = readFileSync(file, 'utf8').replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, '');
  const declared = new RegExp(`export type ${name} =([^;]+);`).exec(source);
  const members = [...(declared?.[1] ?? '').matchAll(/'([^']+)'/g)].map(([, member]) => member);
  if (members.length === 0) throw new Error(`${name} is no union of texts in ${file.pathname}.`);
  return members;
}
