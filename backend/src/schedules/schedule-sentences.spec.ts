import { describe, expect, it } from '@jest/globals';
import { SCHEDULE_REASON_CODES, type ScheduleReason } from '#shared/contracts/schedule-reasons';
import { line, problemsOf, read } from './schedule-csv.fixture';
import { sentenceOf } from './schedule-sentences';

describe('sentenceOf', () => {
  it.each<[ScheduleReason, string]>([
    [
      { code: 'unknownUnit', params: { text: 'psq', units: ['ft', 'm', 'in'] } },
      'The unit "psq" is not known here; write ft, m or in.',
    ],
    [
      { code: 'outOfRange', params: { text: '-77', low: -76, high: 68, unit: 'degF' } },
      '"-77" is out of the plausible range, -76 °F to 68 °F; check the number and its unit.',
    ],
    [
      { code: 'moreProblems', params: { count: 1 } },
      '1 more problem follows; put right those listed and import again.',
    ],
    [
      { code: 'fileTooLarge', params: { bytes: 5 * 1024 * 1024 } },
      'The file is larger than 5 MB; remove what is not part of the schedule and import again.',
    ],
  ])('says %j', (reason, sentence) => {
    expect(sentenceOf(reason)).toBe(sentence);
  });

  it('stands beside each reason of a refusal', () => {
    const [problem] = problemsOf(read([line({ 'Temperature class': 'cool' })]));
    expect(problem?.message).toBe('"cool" is not a known word here; write one of: low, medium, high.');
    const [missing] = problemsOf(read([line({ System: undefined })]));
    expect(missing?.message).toMatch(
      /^The column "System" is missing; add it\. The headings found are: "Ref/,
    );
  });
});

describe('the codes of reasons', () => {
  it('differ', () => {
    expect(new Set(SCHEDULE_REASON_CODES).size).toBe(SCHEDULE_REASON_CODES.length);
  });
});
