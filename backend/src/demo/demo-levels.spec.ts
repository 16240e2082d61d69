import { join } from 'node:path';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from '@jest/globals';
import { judge } from '#shared/checklist/judge';
import type { Step } from '#shared/checklist/step';
import type { OpeningId } from '#shared/plant/ids';
import { PROJECT_FOLDER } from '../app/project-folder';
import { specificationsOf } from '../plant/plant.repository';
import { mergeSchedule } from '../schedules/merge-schedule';
import { parseSchedule } from '../schedules/schedule-parser';
import { chooseTemplate } from '../templates/engine/choose-template';
import { expandTemplate } from '../templates/engine/expand-template';
import { loadShippedTemplates } from '../templates/engine/load-shipped-templates';
import { demoAnswer } from './demo-answer';
import { steadyNumbers } from './steady-numbers';

const uuid = (number: number): string => `01930000-0000-7000-8000-${String(number).padStart(12, '0')}`;

function demoStore() {
  const reading = parseSchedule(
    readFileSync(join(PROJECT_FOLDER, 'backend', 'demo', 'harbor-street-schedule.csv')),
  );
  if (!reading.ok) throw new Error('The demo schedule is not read.');
  let made = 10;
  const nothing = { systems: [], suctionGroups: [], circuits: [], fixtures: [], coils: [] };
  const rows = mergeSchedule(
    { companyId: uuid(1), openingId: uuid(2) },
    reading.schedule,
    nothing,
    new Date(0),
    () => uuid((made += 1)),
  );
  const opening = { id: uuid(2) as OpeningId, name: 'Harbor', elevationM: 1609, unitSystem: 'us' };
  return specificationsOf(opening, rows);
}

const specifications = demoStore();
const documents = loadShippedTemplates(join(PROJECT_FOLDER, 'templates')).map(({ document }) => document);

describe('the shipped templates over the demo store', () => {
  it('give every system, group and circuit its steps', () => {
    const chosen = new Map<string, number>();
    for (const specification of specifications) {
      const template = chooseTemplate(documents, specification);
      if (!template) throw new Error(`Nothing for ${specification.circuit.code}.`);
      expect(expandTemplate(template, specification).steps.length).toBeGreaterThan(10);
      const level = specification.level ?? 'circuit';
      expect(template.level).toBe(level);
      chosen.set(level, (chosen.get(level) ?? 0) + 1);
    }
    expect(Object.fromEntries(chosen)).toEqual({ system: 2, suctionGroup: 5, circuit: 82 });
  });

  it('are answered by a careful installer so that every step counts and none lies outside', async () => {
    const random = steadyNumbers(7);
    let taken = 0;
    const photo = async () =>
      Promise.resolve({
        sha256: String((taken += 1)).padStart(64, '0'),
        originalSha256: null,
        bytes: 1,
        width: 1,
        height: 1,
        capturedAt: null,
      });
    const wrong: string[] = [];
    for (const specification of specifications) {
      const template = chooseTemplate(documents, specification);
      if (!template) throw new Error('No template applies.');
      const { steps, facts } = expandTemplate(template, specification);
      for (const step of steps) {
        const scene = { specification, facts, author: 'A. Person', random, photo };
        const judgement = judge(step, await demoAnswer(step, scene), facts);
        if (!judgement.counts || judgement.outcome === 'outside') wrong.push(told(step, judgement));
      }
    }
    expect(wrong).toEqual([]);
  });
});

function told({ key }: Step, judgement: ReturnType<typeof judge>): string {
  const { outcome, verdicts, doubts } = judgement;
  return `${key}: ${outcome} ${[...(verdicts ?? []), ...doubts.map(({ kind }) => kind)].join(' ')}`;
}
