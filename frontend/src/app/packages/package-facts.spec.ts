import { describe, expect, it } from '@jest/globals';
import type { HandoverPackage } from '#shared/contracts/packages';
import { coverageOf, fileNameOf, grouped, newestFirst, sizeText } from './package-facts';

describe('newestFirst', () => {
  it('orders by version and changes nothing', () => {
    const packages = [{ version: 1 }, { version: 3 }, { version: 2 }] as unknown as HandoverPackage[];
    expect(newestFirst(packages).map(({ version }) => version)).toEqual([3, 2, 1]);
    expect(packages[0]?.version).toBe(1);
  });
});

describe('sizeText', () => {
  it.each([
    [2_450_000, 'en', '2.5 MB'],
    [2_450_000, 'es', '2.5 MB'],
    [118_300_000, 'en', '118 MB'],
  ] as const)('writes %i in %s as %s', (bytes, language, text) => {
    expect(sizeText(bytes, language)).toBe(text);
  });
});

describe('grouped', () => {
  it('parts a hash into fours without a space at the end', () => {
    expect(grouped('0123456789ab')).toBe('0123 4567 89ab');
  });
});

describe('fileNameOf', () => {
  it.each([
    ['Juniper Street #4', 'handover-juniper-street-4-v2.pdf'],
    ['Plaza Peña/Norte', 'handover-plaza-pena-norte-v2.pdf'],
    ['***', 'handover-package-v2.pdf'],
  ])('makes a name of %p', (openingName, name) => {
    expect(fileNameOf({ openingName, version: 2 })).toBe(name);
  });
});

describe('coverageOf', () => {
  it('counts every circuit, with or without a checklist', () => {
    const systems = [
      { joints: [{ state: 'approved' as const }, { state: 'noSequence' as const }] },
      { joints: [{ state: 'submitted' as const }] },
    ];
    expect(coverageOf(systems)).toEqual({ approved: 1, total: 3 });
  });
});
