import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { CircuitRow } from '#shared/contracts/openings';
import { withWords } from '../ui/words/with-words.fixture';
import { CircuitTable } from './circuit-table';

const row = (code: string): CircuitRow =>
  ({
    circuitId: code,
    level: code === 'Rack A' ? 'system' : 'circuit',
    sequenceId: code === 'A3' ? null : `s-${code}`,
    code,
    description: 'Dairy',
    area: 'Sales floor',
    systemName: 'Rack A',
    suctionGroupName: 'A-MT',
    state: 'submitted',
    stepsDone: 4,
    stepsTotal: 9,
    outsideCount: code === 'A2' ? 2 : 0,
    assigneeName: null,
  }) as unknown as CircuitRow;

describe('CircuitTable', () => {
  let fixture: ComponentFixture<CircuitTable>;
  let toggled: { id: string; isRange: boolean }[];
  const boxes = (): HTMLInputElement[] => [
    ...(fixture.nativeElement as HTMLElement).querySelectorAll<HTMLInputElement>('tbody input'),
  ];
  const rows = (): HTMLTableRowElement[] =>
    [...(fixture.nativeElement as HTMLElement).querySelectorAll('tr')].slice(1);

  beforeEach(async () => {
    TestBed.configureTestingModule({ imports: [CircuitTable, withWords()], providers: [provideRouter([])] });
    fixture = TestBed.createComponent(CircuitTable);
    fixture.componentRef.setInput('rows', ['A1', 'A2', 'A3'].map(row));
    fixture.componentRef.setInput('selected', new Set(['A1']));
    fixture.componentRef.setInput('selectable', true);
    toggled = [];
    fixture.componentInstance.toggled.subscribe((event) => toggled.push(event));
    await fixture.whenStable();
  });

  it('shows state, progress and what is outside', () => {
    const text = rows()[1]?.textContent?.replace(/\s+/g, ' ');
    expect(text).toContain('Submitted');
    expect(text).toContain('4/9');
    expect(text).toContain('Outside');
  });

  it('says what the work of a system is where a circuit has its description', async () => {
    fixture.componentRef.setInput('rows', [{ ...row('Rack A'), description: '', suctionGroupName: '' }]);
    await fixture.whenStable();
    expect(rows()[0]?.querySelector('.description')?.textContent?.trim()).toBe('System');
    expect(rows()[0]?.querySelector('.system')?.textContent?.trim()).toBe('Rack A');
  });

  it('links a circuit to its sequence, and none where no checklist applies', () => {
    expect(rows()[0]?.querySelector('a')?.getAttribute('href')).toBe('/review/s-A1');
    expect(rows()[2]?.querySelector('a')).toBeNull();
  });

  it('is one Tab stop, moves by arrows and extends with Shift', async () => {
    boxes()[0]?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowDown', shiftKey: true }));
    await fixture.whenStable();
    expect(boxes().map(({ tabIndex }) => tabIndex)).toEqual([-1, 0, -1]);
    expect(toggled).toEqual([{ id: 'A2', isRange: true }]);
  });

  it('asks for all that is shown with Ctrl and A', () => {
    let all = 0;
    fixture.componentInstance.toggledAll.subscribe(() => (all += 1));
    boxes()[1]?.dispatchEvent(new KeyboardEvent('keydown', { key: 'a', ctrlKey: true }));
    expect(all).toBe(1);
  });

  it('has no boxes for somebody who may not assign', async () => {
    fixture.componentRef.setInput('selectable', false);
    await fixture.whenStable();
    expect(boxes()).toEqual([]);
  });
});
