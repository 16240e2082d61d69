import type { TranslocoTranspiler, TranspileParams } from '@jsverse/transloco';

const PLACEHOLDER = /\{\{\s*([\w.]+)\s*\}\}/g;

/**
 * Fills the placeholders of a phrase, each once. The library's own looks again through what it has put in, so that a
 * fixture whose tag holds two braces would be looked through for ever: what people wrote is put in as it is.
 */
export class PlainTranspiler implements TranslocoTranspiler {
  transpile({ value, params = {} }: Pick<TranspileParams, 'value' | 'params'>): unknown {
    const phrase: unknown = value;
    if (typeof phrase !== 'string') return phrase;
    return phrase.replace(PLACEHOLDER, (_whole, name: string) => {
      const param: unknown = params[name];
      return param === undefined || param === null ? '' : String(param);
    });
  }
}
