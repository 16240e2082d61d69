import {
  Composer,
  isAlias,
  isMap,
  isNode,
  isScalar,
  isSeq,
  Parser,
  visit,
  type CST,
  type Document,
  type Node,
} from 'yaml';
import { refuseTemplate } from './refuse-template';
import type { Problem, SourceText } from './source-text';

/** 200 kB is some thirty times the longest shipped template. */
const MOST_CHARACTERS = 200_000;
/** A template nests sections, steps, options and their texts: 9 levels. Counted in pairs and items, so twice that. */
const DEEPEST = 24;

export type YamlPath = readonly (string | number)[];

/** The values of a YAML document and where each of them stands. */
export interface YamlDocument {
  readonly value: unknown;
  /** Whether a value is written at `path`. */
  has(path: YamlPath): boolean;
  /** Where the value at `path` begins; for what isn't written, where its nearest parent's key begins. */
  offsetOf(path: YamlPath): number;
  /** Where the key of the value at `path` begins; for an item of a list, where the item begins. */
  keyOffsetOf(path: YamlPath): number;
  /** Where character `index` of the text at `path` stands; its beginning where folding or escapes hide that. */
  offsetInText(path: YamlPath, index: number): number;
}

/**
 * Reads YAML 1.2 (core schema) without what templates don't need: anchors, aliases, tags, several documents.
 *
 * @throws {DomainFailure} templateRefused with every place that can't be read
 */
export function readYaml(source: SourceText): YamlDocument {
  if (source.text.length > MOST_CHARACTERS) {
    refuseTemplate(source, [
      { offset: MOST_CHARACTERS, sentence: `A template is at most ${MOST_CHARACTERS / 1000} kB long.` },
    ]);
  }
  const tokens = [...new Parser().parse(source.text)];
  const tooDeep = findTooDeep(tokens);
  if (tooDeep !== null) refuseTemplate(source, [{ offset: tooDeep, sentence: 'This is nested too deeply.' }]);

  const composer = new Composer({ version: '1.2', schema: 'core', strict: true, uniqueKeys: true });
  const documents: Document[] = [...composer.compose(tokens, true, source.text.length)];
  const [document] = documents;
  const problems = documents.flatMap((each) => problemsOf(each));
  const second = documents[1];
  if (second) problems.push({ offset: second.range?.[0] ?? 0, sentence: 'A file holds one template only.' });
  if (problems.length > 0 || !document) {
    refuseTemplate(source, problems.length > 0 ? problems : [{ offset: 0, sentence: 'The file is empty.' }]);
  }
  return locate(document, source.text);
}

/** Walks without recursion: this is what protects the recursive steps that follow. */
function findTooDeep(tokens: readonly CST.Token[]): number | null {
  const open: { token: CST.Token; depth: number }[] = tokens.map((token) => ({ token, depth: 0 }));
  for (let next = open.pop(); next; next = open.pop()) {
    const { token, depth } = next;
    if (depth > DEEPEST) return 'offset' in token ? token.offset : 0;
    if (token.type === 'document' && token.value) open.push({ token: token.value, depth });
    if (!('items' in token)) continue;
    for (const item of token.items) {
      if (item.key) open.push({ token: item.key, depth: depth + 1 });
      if (item.value) open.push({ token: item.value, depth: depth + 1 });
    }
  }
  return null;
}

function problemsOf(document: Document): Problem[] {
  const problems: Problem[] = [...document.errors, ...document.warnings].map((error) => ({
    offset: error.pos[0],
    sentence: `${error.message.replace(/\.$/, '')}.`,
  }));
  visit(document, {
    Node(_key, node) {
      const offset = node.range?.[0] ?? 0;
      if (isAlias(node)) problems.push({ offset, sentence: 'Aliases are not allowed: write the value out.' });
      else if (node.anchor)
        problems.push({ offset, sentence: 'Anchors are not allowed: write the value out.' });
    },
  });
  return problems;
}

interface Found {
  readonly key: number;
  readonly node: Node | null;
  readonly exists: boolean;
}

function locate(document: Document, text: string): YamlDocument {
  const find = (path: YamlPath): Found => {
    let node: Node | null = isNode(document.contents) ? document.contents : null;
    let key = startOf(node, 0);
    for (const segment of path) {
      const child = childOf(node, segment);
      if (!child) return { key, node: null, exists: false };
      ({ key, node } = child);
    }
    return { key, node, exists: true };
  };
  return {
    value: document.toJS({ maxAliasCount: 0 }),
    has: (path) => find(path).exists,
    offsetOf: (path) => {
      const found = find(path);
      return startOf(found.node, found.key);
    },
    keyOffsetOf: (path) => find(path).key,
    offsetInText: (path, index) => {
      const found = find(path);
      const start = startOf(found.node, found.key);
      if (!isScalar(found.node) || typeof found.node.value !== 'string') return start;
      const quoted = found.node.type === 'QUOTE_DOUBLE' || found.node.type === 'QUOTE_SINGLE' ? 1 : 0;
      const written = text.slice(start + quoted, start + quoted + found.node.value.length);
      return written === found.node.value ? start + quoted + index : start;
    },
  };
}

function childOf(node: Node | null, segment: string | number): { key: number; node: Node | null } | null {
  if (isMap(node)) {
    const pair = node.items.find((item) => isScalar(item.key) && String(item.key.value) === String(segment));
    if (!pair || !isScalar(pair.key)) return null;
    const key = startOf(pair.key, startOf(node, 0));
    return { key, node: isNode(pair.value) ? pair.value : null };
  }
  if (isSeq(node) && typeof segment === 'number') {
    const item = node.items[segment];
    return isNode(item) ? { key: startOf(item, 0), node: item } : null;
  }
  return null;
}

function startOf(node: Node | null, otherwise: number): number {
  return node?.range?.[0] ?? otherwise;
}
