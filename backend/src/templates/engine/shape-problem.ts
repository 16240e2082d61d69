import type * as z from 'zod/mini';
import type { Problem } from './source-text';
import type { YamlDocument, YamlPath } from './yaml-document';

type Issue = z.core.$ZodIssue;

/** Turns what the shape check found into problems with a place and a sentence. */
export function shapeProblems(issues: readonly Issue[], document: YamlDocument): Problem[] {
  return issues.flatMap((issue) => problemsOf(issue, document));
}

function problemsOf(issue: Issue, document: YamlDocument): Problem[] {
  const path = issue.path as YamlPath;
  const name = path.length > 0 ? `\`${String(path.at(-1))}\`` : 'The template';
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      offset: document.keyOffsetOf([...path, key]),
      sentence: `\`${key}\` is not a key that belongs here.`,
    }));
  }
  if (path.length > 0 && !document.has(path)) {
    return [{ offset: document.offsetOf(path), sentence: missingSentence(String(path.at(-1))) }];
  }
  return [{ offset: document.offsetOf(path), sentence: `${name} ${wrongSentence(issue)}` }];
}

function missingSentence(key: string): string {
  if (key === 'en' || key === 'es')
    return `\`${key}\` is missing here: every text stands in English and in Spanish.`;
  if (key === 'min_count') return '`min_count` is missing here: a photo step says how many photos it needs.';
  return `\`${key}\` is missing here.`;
}

const EXPECTED: Readonly<Record<string, string>> = {
  string: 'must be text',
  boolean: 'must be true or false',
  number: 'must be a number',
  int: 'must be a whole number',
  array: 'must be a list',
  object: 'must hold keys with values',
};

function wrongSentence(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return `${EXPECTED[issue.expected] ?? `must be of type ${issue.expected}`}.`;
    case 'invalid_value':
      return `must be ${issue.values.length > 1 ? 'one of ' : ''}${issue.values.map(String).join(', ')}.`;
    case 'invalid_union':
      return 'must be one of confirm, choose, reading, superheat, photo, note, override, signature.';
    case 'too_small':
      if (issue.origin === 'string') return 'must not be empty.';
      return `must ${issue.origin === 'array' ? 'have' : 'be'} at least ${String(issue.minimum)}${measure(issue.origin)}.`;
    case 'too_big':
      return `must ${issue.origin === 'array' ? 'have' : 'be'} at most ${String(issue.maximum)}${measure(issue.origin)}.`;
    case 'invalid_format':
      return 'must begin with a small letter and hold only small letters, digits and hyphens, at most 60.';
    default:
      return 'is not as it must be.';
  }
}

function measure(origin: string): string {
  if (origin === 'array') return ' items';
  return origin === 'string' ? ' characters long' : '';
}
