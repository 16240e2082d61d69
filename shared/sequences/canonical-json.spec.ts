import { describe, expect, it } from '@jest/globals';
import { canonicalJson } from './canonical-json';

/** The number whose IEEE 754 bits are these 16 hexadecimal digits. */
function double(bits: string): number {
  const view = new DataView(new ArrayBuffer(8));
  view.setBigUint64(0, BigInt(`0x${bits}`));
  return view.getFloat64(0);
}

// RFC 8785's own examples, written down from memory: sections 3.2.2, 3.2.3 and appendix B.

describe('canonicalJson', () => {
  it('gives the text of the example in RFC 8785, section 3.2.2', () => {
    const value = JSON.parse(String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`);
    expect(canonicalJson(value)).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`,
    );
  });

  it('sorts names by their UTF-16 code units, as the example in RFC 8785, section 3.2.3', () => {
    const value = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    };
    expect(canonicalJson(value).match(/(?<=:")[^"]+/g)).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ]);
  });

  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555555', '333333333.3333333'],
  ])('writes the number %s of RFC 8785, appendix B, as %s', (bits, text) => {
    expect(canonicalJson(double(bits))).toBe(text);
  });

  it('is the same for any order of members, at any depth, and another for any order of a list', () => {
    expect(canonicalJson({ b: { d: 1, c: [1, 2] }, a: 2 })).toBe(
      canonicalJson({ a: 2, b: { c: [1, 2], d: 1 } }),
    );
    expect(canonicalJson([1, 2])).not.toBe(canonicalJson([2, 1]));
  });

  it('leaves out a member that is undefined, as JSON does', () => {
    expect(canonicalJson({ a: undefined, b: null })).toBe('{"b":null}');
  });

  it('comes out the same after a journey as JSON', () => {
    const value = { text: 'a\u2028b \u00e9', list: [0.1, -0, 1e21, 41.0], empty: {} };
    expect(canonicalJson(JSON.parse(JSON.stringify(value)))).toBe(canonicalJson(value));
  });

  it.each([[undefined], [() => 1], [Number.NaN], [{ value: Number.POSITIVE_INFINITY }]])(
    'refuses what JSON has no form for: %p',
    (value) => {
      expect(() => canonicalJson(value)).toThrow();
    },
  );
});
