import { TestBed } from '@angular/core/testing';
import { afterEach, beforeEach, describe, expect, it, jest } from '@jest/globals';
import { RecordPause } from './record-pause';

describe('RecordPause', () => {
  beforeEach(() => void jest.useFakeTimers());
  afterEach(() => void jest.useRealTimers());

  it('lasts 600 ms from the last recording', () => {
    TestBed.configureTestingModule({ providers: [RecordPause] });
    const pause = TestBed.inject(RecordPause);
    expect(pause.isOn).toBe(false);
    pause.begin();
    jest.advanceTimersByTime(400);
    pause.begin();
    jest.advanceTimersByTime(400);
    expect(pause.isOn).toBe(true);
    jest.advanceTimersByTime(200);
    expect(pause.isOn).toBe(false);
  });
});
