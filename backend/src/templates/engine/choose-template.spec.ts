import { describe, expect, it } from '@jest/globals';
import { chooseTemplate } from './choose-template';
import { classedTable, specificationWith } from './circuit-specification.fixture';
import { parseTemplate } from './parse-template';
import { templateText } from './written-template.fixture';

function template(key: string, version: number, priority: number, applies = 'true') {
  const text = templateText({ head: `applies: '${applies}'` })
    .replace('key: trial', `key: ${key}`)
    .replace('version: 3', `version: ${version}`)
    .replace('priority: 5', `priority: ${priority}`);
  return parseTemplate(text, `${key}.yaml`);
}

describe('chooseTemplate', () => {
  const specification = specificationWith();

  it('takes the highest priority of those that apply', () => {
    const walkIn = template('walk-in', 1, 40, 'circuit.hasWalkIn');
    const cases = template('cases', 1, 20, 'circuit.temperatureClass == "medium"');
    const plain = template('plain', 1, 0);
    expect(chooseTemplate([plain, walkIn, cases], specification)).toBe(cases);
  });

  it('knows the safety class by the maker’s table that the company works by', () => {
    const burning = template('burning', 1, 90, 'system.safetyClass != "A1"');
    const plain = template('plain', 1, 0);
    expect(chooseTemplate([plain, burning], specification)).toBe(plain);
    expect(chooseTemplate([plain, burning], specification, classedTable('R-448A', 'A2L'))).toBe(burning);
  });

  it('gives null when none applies', () => {
    expect(chooseTemplate([template('walk-in', 1, 40, 'circuit.hasWalkIn')], specification)).toBeNull();
    expect(chooseTemplate([], specification)).toBeNull();
  });

  it('looks only at the newest version of each template', () => {
    const old = template('cases', 1, 90);
    const newer = template('cases', 2, 10);
    expect(chooseTemplate([newer, old], specification)).toBe(newer);
    const nowForWalkIns = template('cases', 3, 10, 'circuit.hasWalkIn');
    expect(chooseTemplate([old, nowForWalkIns], specification)).toBeNull();
  });

  it('settles equal priorities by key, whatever the order of the list', () => {
    const a = template('aisle', 1, 10);
    const b = template('bay', 1, 10);
    expect(chooseTemplate([b, a], specification)).toBe(a);
    expect(chooseTemplate([a, b], specification)).toBe(a);
  });
});
