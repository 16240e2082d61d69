import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from '@jest/globals';

const HERE = __dirname;
const APP = path.join(HERE, '..', 'app');

/**
 * Keys that are put together at run time end with a member of a closed set (a state, a role, a code …). Most are built on
 * a beginning that ends in an underscore and stands in the source as such; those that aren't are listed here.
 */
const BUILT_AT_RUN_TIME = ['work.asFound', 'work.asLeft', 'ui.'];

type Words = Record<string, string>;
const words = (language: string, scope: string): Words =>
  JSON.parse(readFileSync(path.join(HERE, language, `${scope}.json`), 'utf8')) as Words;
const scopes = readdirSync(path.join(HERE, 'en')).map((file) => file.replace('.json', ''));
const parameters = (text: string): string[] =>
  [...text.matchAll(/\{\{\s*(\w+)\s*\}\}/g)].map((match) => match[1]!).sort();

function sources(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const file = path.join(folder, entry.name);
    if (entry.isDirectory()) return sources(file);
    return /\.(ts|html)$/.test(entry.name) && !/\.(spec|fixture)\.ts$/.test(entry.name) ? [file] : [];
  });
}

const SCOPE = scopes.join('|');
/** Without comments, whose examples are no uses. */
const texts = sources(APP).map((file) =>
  readFileSync(file, 'utf8')
    .replace(/\/\*[\s\S]*?\*\//g, '')
    .replace(/^\s*\/\/.*$/gm, ''),
);

/** The scopes that a file's template names as a prefix: its keys stand there without it. */
const prefixesOf = (text: string): string[] =>
  [...text.matchAll(/prefix:\s*'([a-z]+)'/g)].map((match) => match[1]!);

/** All quoted words of the sources that are, or could be, keys: with their scope. */
function quotedKeys(): { certain: Set<string>; possible: Set<string> } {
  const certain = new Set<string>();
  const possible = new Set<string>();
  for (const text of texts) {
    for (const [, key] of text.matchAll(new RegExp(`['"\`]((?:${SCOPE})\\.[A-Za-z0-9_]+)['"\`$]`, 'g')))
      certain.add(key!);
    for (const [, key] of text.matchAll(/['"`]([A-Za-z][A-Za-z0-9_]*)['"`$]/g)) {
      for (const scope of scopes) possible.add(`${scope}.${key}`);
    }
    for (const prefix of prefixesOf(text)) {
      for (const [, key] of text.matchAll(/\bt\('([A-Za-z0-9_]+)'[,)]/g)) certain.add(`${prefix}.${key}`);
    }
  }
  return { certain, possible };
}

const { certain, possible } = quotedKeys();
const beginnings = [...certain, ...possible].filter((key) => key.endsWith('_')).concat(BUILT_AT_RUN_TIME);

/** Whether a key stands in the source, is counted (`One`, `Many`), or is put together from a beginning that does. */
function isUsed(key: string): boolean {
  const counted = key.replace(/(One|Many)$/, '');
  return (
    [key, counted].some((one) => certain.has(one) || possible.has(one)) ||
    beginnings.some((one) => key.startsWith(one))
  );
}

/** Whether there are words for a key that stands in the source, be it whole, counted or a beginning. */
function hasWords(key: string, all: ReadonlySet<string>): boolean {
  if (key.endsWith('_')) return [...all].some((one) => one.startsWith(key));
  return all.has(key) || (all.has(`${key}One`) && all.has(`${key}Many`));
}

describe.each(scopes)('the words of %s', (scope) => {
  it('are the same keys in both languages', () => {
    expect(Object.keys(words('es', scope)).sort()).toEqual(Object.keys(words('en', scope)).sort());
  });

  it('take the same parameters in both languages', () => {
    const es = words('es', scope);
    for (const [key, text] of Object.entries(words('en', scope))) {
      expect([key, parameters(es[key] ?? '')]).toEqual([key, parameters(text)]);
    }
  });

  it('are all used', () => {
    const unused = Object.keys(words('en', scope)).filter((key) => !isUsed(`${scope}.${key}`));
    expect(unused).toEqual([]);
  });
});

describe('the sources', () => {
  it('use no key that has no words', () => {
    const all = new Set(
      scopes.flatMap((scope) => Object.keys(words('en', scope)).map((key) => `${scope}.${key}`)),
    );
    const missing = [...certain].filter((key) => !hasWords(key, all));
    expect(missing).toEqual([]);
  });
});
