import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { OpeningId } from '#shared/plant/ids';
import { ScheduleUpload } from './schedule-upload';
import { SchedulesApi, type UploadStep } from './schedules-api';

const OPENING = 'o' as OpeningId;
const read = {
  stored: false,
  revision: 1,
  systems: 2,
  suctionGroups: 4,
  circuits: 60,
  fixtures: 140,
  coils: 160,
  sequences: 60,
};

describe('ScheduleUpload', () => {
  let steps: Subject<UploadStep>;
  let calls: boolean[];
  let upload: ScheduleUpload;
  const file = new File(['a,b'], 'schedule.csv');

  beforeEach(() => {
    steps = new Subject();
    calls = [];
    const api = {
      upload: (_opening: OpeningId, _file: File, store: boolean) => {
        calls.push(store);
        return steps;
      },
    };
    TestBed.configureTestingModule({ providers: [ScheduleUpload, { provide: SchedulesApi, useValue: api }] });
    upload = TestBed.inject(ScheduleUpload);
  });

  it('checks first and stores only when asked', () => {
    upload.check(OPENING, file);
    steps.next({ sent: 0.5 });
    expect(upload.state()).toEqual({ kind: 'sending', isImport: false, sent: 0.5 });
    steps.next({ read });
    expect(upload.state().kind).toBe('checked');
    upload.import(OPENING);
    steps.next({ read });
    expect(upload.state().kind).toBe('imported');
    expect(calls).toEqual([false, true]);
  });

  it('sends nothing that can not be a schedule', () => {
    upload.check(OPENING, new File(['x'], 'plan.pdf'));
    expect(upload.state()).toEqual({ kind: 'unfit', fault: 'notCsv' });
    expect(calls).toEqual([]);
  });

  it('shows the rows of a refusal and takes the corrected file after it', () => {
    upload.check(OPENING, file);
    const reason = { code: 'notANumber', params: { text: 'x' } };
    const rows = [{ row: 3, column: 'Load', reason, message: 'It is not a number.' }];
    const error = {
      type: '',
      title: '',
      status: 422,
      detail: '',
      code: 'scheduleRefused',
      places: [],
      requestId: '',
    };
    steps.error({ status: 422, error: { ...error, facts: { rows } } });
    expect(upload.state()).toEqual({ kind: 'refused', rows });
    steps = new Subject();
    upload.check(OPENING, file);
    expect(upload.state().kind).toBe('sending');
  });

  it('stops the upload when cancelled, and keeps the file', () => {
    upload.check(OPENING, file);
    upload.stop();
    expect(steps.observed).toBe(false);
    expect(upload.state().kind).toBe('choosing');
    expect(upload.file()).toBe(file);
  });

  it('does the same again after a lost network', () => {
    upload.check(OPENING, file);
    steps.next({ read });
    upload.import(OPENING);
    steps.error({ status: 0 });
    expect(upload.state()).toMatchObject({ kind: 'failed', isImport: true });
    steps = new Subject();
    upload.retry(OPENING);
    expect(calls).toEqual([false, true, true]);
  });
});
