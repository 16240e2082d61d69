import { describe, expect, it, jest } from '@jest/globals';
import { HttpErrorResponse } from '@angular/common/http';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type {
  DefrostPlanPage,
  DefrostPlanRequest,
  SavedDefrostPlan,
  ScheduledDefrost,
} from '#shared/contracts/defrost-plans';
import { plannedCircuits } from '#shared/contracts/defrost-circuits';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { planDefrosts } from '#shared/refrigeration/defrost/plan-defrosts';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { withWords } from '../ui/words/with-words.fixture';
import { DefrostPage } from './defrost-page';
import { DefrostsApi } from './defrosts-api';
import { Planner, type PlanQuestion } from './planner';

const HOUR_S = 3600;

const scheduled = (id: string, change: Partial<ScheduledDefrost> = {}): ScheduledDefrost => ({
  id: id as ScheduledDefrost['id'],
  code: id.toUpperCase(),
  description: 'Dairy',
  systemName: 'Rack A',
  groupId: 'g' as ScheduledDefrost['groupId'],
  groupName: 'AS-1',
  type: 'offTime',
  perDay: 2,
  failSafeS: 1800,
  dripS: null,
  loadW: 3000,
  walkIns: [],
  ...change,
});

function saved(
  circuits: readonly ScheduledDefrost[],
  startsH: readonly (readonly number[])[],
): SavedDefrostPlan {
  return {
    id: 'p1',
    version: 3,
    rules: { ...USUAL_DEFROST_RULES, largestShareOfLoad: 0.5, quietHours: [] },
    details: [],
    circuits: [...plannedCircuits(circuits, [])],
    plan: circuits.map(({ id }, index) => ({
      circuitId: id,
      startsS: (startsH[index] ?? []).map((hour) => hour * HOUR_S),
    })),
    breaches: [],
    notes: [],
    createdAt: '2026-11-29T15:30:00.000Z',
    createdByName: 'Dana Reyes',
  };
}

interface Setting {
  readonly circuits?: readonly ScheduledDefrost[];
  readonly newest?: SavedDefrostPlan | null;
  readonly maySave?: boolean;
}

const TWO = [scheduled('a1'), scheduled('a2')];

async function open({
  circuits = TWO,
  newest = saved(TWO, [
    [0, 12],
    [6, 18],
  ]),
  maySave = true,
}: Setting = {}) {
  const page: DefrostPlanPage = {
    opening: { id: 'o1' as never, name: 'Harbor', timeZone: 'America/Denver', unitSystem: 'us' },
    circuits: [...circuits],
    newest,
  };
  const save = jest
    .fn<(id: string, request: DefrostPlanRequest) => Promise<SavedDefrostPlan>>()
    .mockImplementation(async (_id, request) => ({
      ...saved(circuits, []),
      ...request,
      version: request.basedOn + 1,
    }));
  const plan = jest
    .fn<(question: PlanQuestion) => Promise<ReturnType<typeof planDefrosts>>>()
    .mockImplementation(async ({ circuits: list, rules }) => planDefrosts(list, rules));
  TestBed.configureTestingModule({
    imports: [DefrostPage, withWords()],
    providers: [
      provideRouter([]),
      { provide: DefrostsApi, useValue: { read: async () => page, save } },
      { provide: Planner, useValue: { plan } },
      { provide: Session, useValue: { may: () => maySave } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(DefrostPage);
  fixture.componentRef.setInput('openingId', 'o1');
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const settle = () => fixture.whenStable();
  return {
    root,
    save,
    plan,
    settle,
    bars: () => [...root.querySelectorAll<SVGElement>('.bar')],
    key: async (bar: SVGElement | undefined, key: string, shiftKey = false) => {
      bar?.dispatchEvent(new KeyboardEvent('keydown', { key, shiftKey, bubbles: true, cancelable: true }));
      await settle();
    },
    press: async (words: string) => {
      const button = [...root.querySelectorAll('button')].find((each) => each.textContent?.trim() === words);
      button?.click();
      await settle();
      return button;
    },
    type: async (selector: string, text: string) => {
      const box = root.querySelector<HTMLInputElement>(selector);
      if (box) box.value = text;
      box?.dispatchEvent(new Event('input'));
      await settle();
    },
  };
}

const valueText = (bar: SVGElement | undefined): string | null | undefined =>
  bar?.getAttribute('aria-valuetext');

describe('DefrostPage', () => {
  it('moves a defrost by 5 minutes with an arrow key and by 30 with Shift, and keeps it there', async () => {
    const { bars, key, press, save } = await open();
    await key(bars()[0], 'ArrowRight');
    expect(valueText(bars()[0])).toBe('00:05 to 00:35');
    await key(bars()[0], 'ArrowRight', true);
    expect(valueText(bars()[0])).toBe('00:35 to 01:05');
    await press('Save as a new version');
    const [, request] = save.mock.calls[0] ?? [];
    expect(request?.basedOn).toBe(3);
    expect(request?.plan[0]?.startsS).toEqual([2100, 12 * HOUR_S]);
    expect(request?.details[0]?.fixedStartsS).toEqual([2100]);
  });

  it('moves a defrost past midnight, where its bar is drawn in two', async () => {
    const { bars, key, root } = await open();
    await key(bars()[0], 'ArrowLeft');
    const wrapped = bars().find((bar) => valueText(bar) === '23:55 to 00:25');
    expect(wrapped?.querySelectorAll('.full').length).toBe(2);
    expect(root.querySelector('.bar[tabindex="0"]')).toBe(wrapped);
  });

  it('goes to the next circuit with an arrow down and to its other defrost with Page Down', async () => {
    const { bars, key, root } = await open();
    await key(bars()[0], 'ArrowDown');
    expect(root.querySelector('.bar.chosen')?.getAttribute('aria-label')).toBe('A2, defrost 1 of 2');
    await key(bars()[2], 'PageDown');
    expect(root.querySelector('.bar.chosen')?.getAttribute('aria-label')).toBe('A2, defrost 2 of 2');
  });

  it('says at once, in words and in the chart, which rule a move breaks', async () => {
    const newest = saved(TWO, [
      [5.5, 17.5],
      [6, 18],
    ]);
    const { root, bars, key } = await open({ newest });
    expect(root.textContent).toContain('This plan breaks none of its rules.');
    expect(root.textContent).not.toContain('Save with its broken rules');
    await key(bars()[0], 'ArrowRight', true);
    expect(root.textContent).toContain('Save with its broken rules');
    expect(root.textContent).not.toContain('This plan breaks none of its rules.');
    expect(root.querySelector('.breaches')?.textContent).toContain(
      '06:00: A1, A2 start 0 min apart, at least 15 min is asked.',
    );
    const marked = [...root.querySelectorAll('.bar.marked')].map((bar) => bar.getAttribute('aria-label'));
    expect(marked).toEqual(['A1, defrost 1 of 2, breaks a rule', 'A2, defrost 1 of 2, breaks a rule']);
    expect(root.querySelectorAll('.bar.marked .wedge').length).toBe(2);
  });

  it('follows a key that is held down faster than the screen is drawn', async () => {
    const { bars, settle } = await open();
    const [first] = bars();
    for (let index = 0; index < 4; index++)
      first?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight' }));
    await settle();
    expect(valueText(bars()[0])).toBe('00:20 to 00:50');
  });

  it('lays a store out at once that nobody has planned yet, and lets it be saved as version 1', async () => {
    const { bars, plan, press, save } = await open({ newest: null });
    expect(plan).toHaveBeenCalledTimes(1);
    expect(bars().length).toBe(4);
    await press('Save as a new version');
    expect(save.mock.calls[0]?.[1].basedOn).toBe(0);
  });

  it('asks for a fail-safe time that the schedule lacks, and plans nothing before it is given', async () => {
    const circuits = [scheduled('a1', { failSafeS: null }), scheduled('a2')];
    const { root, plan, type, press, bars } = await open({ circuits, newest: null });
    expect(root.querySelector('.needed')?.textContent).toContain('A1 Dairy');
    expect(plan).not.toHaveBeenCalled();
    await type('.needed input', '40');
    await press('Lay out again');
    expect(plan.mock.calls[0]?.[0].circuits[0]?.durationS).toBe(2400);
    expect(bars().length).toBe(4);
  });

  it('says which rule is in the way and shows what fits', async () => {
    const { root, press, bars, type } = await open();
    // 720 minutes between starts leave room for two starts a day in the group, not for four.
    await type('app-rules-form app-number-field:nth-of-type(3) input', '700');
    await press('Lay out again');
    const blocked = root.querySelector('.blocked')?.textContent ?? '';
    expect(blocked).toContain('The day can’t be laid out with these rules');
    expect(blocked).toMatch(/Time between starts: A\d/);
    expect(blocked).toMatch(/Without starts: A\d\./);
    expect(bars().length).toBe(2);
  });

  it('keeps what stands on the screen when somebody else saved meanwhile, and can be put upon it', async () => {
    const { root, bars, key, press, save } = await open();
    await key(bars()[0], 'ArrowRight');
    save.mockRejectedValueOnce(
      new HttpErrorResponse({
        status: 409,
        error: {
          type: 'about:blank',
          title: 'Conflict',
          status: 409,
          detail: '',
          code: 'changedMeanwhile',
          places: [],
          facts: { version: 4 },
          requestId: 'r',
        },
      }),
    );
    await press('Save as a new version');
    expect(root.querySelector('.meanwhile')?.textContent).toContain('Version 4 was saved by somebody else');
    expect(valueText(bars()[0])).toBe('00:05 to 00:35');
    await press('Save mine as version 5');
    expect(save.mock.calls[1]?.[1].basedOn).toBe(4);
    expect(root.querySelector('.meanwhile')).toBeNull();
  });

  it('tells a figure that can not be read, keeps it, and saves nothing until it is mended', async () => {
    const { root, type, press, save } = await open();
    await type('app-rules-form app-number-field:nth-of-type(1) input', '250');
    expect(root.querySelector('app-rules-form [role="alert"]')?.textContent).toContain('1 to 100 %');
    expect(root.querySelector<HTMLInputElement>('app-rules-form input')?.value).toBe('250');
    await press('Save as a new version');
    expect(save).not.toHaveBeenCalled();
  });

  it('shows an installer the plan with nothing to change', async () => {
    const { root, bars } = await open({ maySave: false });
    expect(root.textContent).not.toContain('Lay out again');
    expect(bars()[0]?.getAttribute('role')).toBeNull();
    expect(root.querySelector('svg.plot')?.getAttribute('aria-label')).toBe(
      'A1 starts to defrost at: 00:00, 12:00',
    );
  });
});
