import { PassThrough } from 'node:stream';
import { describe, expect, it, jest } from '@jest/globals';
import type { SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import { dictionariesOf, readPages } from '../../pdf/read-pdf.fixture';
import { plannedCircuit, savedPlan } from './defrost-plan.fixture';
import { CircuitBuilder, packageOf } from './package.fixture';
import { writePackageDocument } from './write-package-document';

// Whole documents on a busy machine.
jest.setTimeout(60_000);

async function write(
  defrostPlan: SavedDefrostPlan | null,
  language: 'en' | 'es' = 'en',
): Promise<{ pages: string[]; bytes: Buffer }> {
  const content = packageOf([new CircuitBuilder(1, 'A-12', 'Dairy wall')], new Map(), language);
  const out = new PassThrough();
  const parts: Buffer[] = [];
  out.on('data', (part: Buffer) => parts.push(part));
  await writePackageDocument({ ...content, defrostPlan }, out, {
    signal: new AbortController().signal,
    onProgress: () => undefined,
  });
  const bytes = Buffer.concat(parts);
  return { pages: readPages(bytes), bytes };
}

const kept = savedPlan(
  [plannedCircuit(1), plannedCircuit(2)],
  [
    [1, 12],
    [6, 23.75],
  ],
);

describe('drawDefrostPlan', () => {
  it('stands after the summary, with the starts, what was saved by whom, and the rules', async () => {
    const { pages } = await write(kept);
    const at = pages.findIndex((page, index) => index > 1 && page.includes('Defrost plan'));
    const text = pages.slice(at).join('\n');
    expect(pages[at - 1]).toContain('Summary');
    expect(pages[1]).toContain('Defrost plan');
    expect(text).toContain('Saved as version 4 by Dana Reyes');
    expect(text).toContain('06:00 23:45');
    expect(text).toContain('30 min + 10 min');
    expect(text).toContain('This plan breaks none of its rules.');
    expect(text).toMatch(/Largest share of load in defrost[\s\S]*50 %/);
    // The defrost of 23:45 goes on past midnight.
    expect(text).toMatch(/Heater demand, all groups · peak 4\.00 kW 00:00 · no limit/);
  });

  it('reads each row of the chart out to those who can not see it', async () => {
    const { bytes } = await write(kept);
    expect(dictionariesOf(bytes)).toContain('A-2: 06:00  23:45');
  });

  it('says which rules the plan breaks, with the value and the limit', async () => {
    const broken = savedPlan(
      [plannedCircuit(1), plannedCircuit(2)],
      [
        [0, 12],
        [0, 12],
      ],
    );
    const text = (await write(broken)).pages.join('\n').replace(/\s+/g, ' ');
    expect(text).toContain('Rules that this plan breaks');
    expect(text).toContain('00:00: A-1, A-2 start 0 min apart, at least 15 min is asked.');
    expect(text).toContain('12:00: 100 % of the suction group is in defrost, 50 % is allowed (A-1, A-2).');
  });

  it('goes on over pages for a group of many circuits, with its head again', async () => {
    const circuits = Array.from({ length: 70 }, (_, index) => plannedCircuit(index + 1));
    const { pages } = await write(savedPlan(circuits, []));
    expect(pages.filter((page) => page.includes('AS-1') && page.includes('21:00')).length).toBeGreaterThan(1);
  });

  it('speaks Spanish', async () => {
    const text = (await write(kept, 'es')).pages.join('\n');
    expect(text).toContain('Plan de deshielo');
    expect(text).toContain('Este plan cumple todas sus reglas.');
  });

  it('is left out, and out of the contents, where there is no plan', async () => {
    expect((await write(null)).pages.join('\n')).not.toContain('Defrost plan');
  });
});
