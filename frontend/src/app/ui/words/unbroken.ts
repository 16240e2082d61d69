import { Pipe, type PipeTransform } from '@angular/core';

const WORD_JOINER = '\u2060';
const NO_BREAK_SPACE = '\u00a0';

/**
 * The same words with codes ("AS-1") and quantities ("5 °F") kept on one line: a browser would break behind the hyphen and
 * at the space. Only for what is shown; what is stored keeps plain signs.
 */
export function unbroken(text: string): string {
  return text
    .replace(/(?<=[\p{L}\d])-(?=\d)/gu, `-${WORD_JOINER}`)
    .replace(/(?<=\d) (?=(?:°|%|psi|bar|kPa|K\b|A\b|V\b|ft\b|m\b|in\b|min\b|h\b|s\b))/g, NO_BREAK_SPACE);
}

/** Titles of steps and names of circuits, which codes and quantities stand in. */
@Pipe({ name: 'appUnbroken' })
export class Unbroken implements PipeTransform {
  transform(text: string): string {
    return unbroken(text);
  }
}
