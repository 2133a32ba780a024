import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import packageDescription from '../../package.json' with { type: 'json' };
import { section } from './section.ts';

const top = new URL('../../', import.meta.url);
const page = readFileSync(new URL('DEVELOPERS.md', top), 'utf8');

describe('DEVELOPERS', () => {
  it('names files and folders that exist', () => {
    const named = [...page.matchAll(/`((?:app|core|test|sample-data|public)\/[^`*\s]*)`/g)].map(([, path]) => path);
    expect(named.length).toBeGreaterThan(20);
    expect(named.filter((path) => !existsSync(new URL(path, top)))).toEqual([]);
  });

  it('lists every command and no other', () => {
    const listed = section(page, 'Commands').names.map((name) => name.replace(/^npm (?:run )?/, '').split(' ')[0]);
    expect(listed.sort()).toEqual(Object.keys(packageDescription.scripts).sort());
  });

  it('says why every library is there', () => {
    const listed = section(page, 'Libraries').names;
    for (const name of Object.keys(packageDescription.dependencies)) {
      const family = name.startsWith('@stdlib/') ? '@stdlib' : name;
      expect(listed, name).toContain(family);
    }
  });
});
