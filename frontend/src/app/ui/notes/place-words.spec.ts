import { describe, expect, it } from '@jest/globals';
import { WORDS as EN } from '../../../i18n/loader/en';
import { WORDS as ES } from '../../../i18n/loader/es';
import { PLACE_FIELDS, placeWords } from './place-words';

describe('placeWords', () => {
  it.each([
    ['body.timeZone', 'place_timeZone'],
    ['opening.elevationM', 'place_elevationM'],
    ['body.remarks.0.stepKey', 'place_remarks'],
    ['name', 'place_name'],
  ])('knows %s', (path, key) => {
    expect(placeWords(path)).toEqual({ key, params: {} });
  });

  it.each(['path.sha256', 'entries.0.body', 'body', ''])('tells %j by its path', (path) => {
    expect(placeWords(path)).toEqual({ key: 'place_other', params: { path } });
  });

  it.each([...PLACE_FIELDS, 'other'])('has words for %s in both languages', (field) => {
    expect(EN.ui).toHaveProperty(`place_${field}`);
    expect(ES.ui).toHaveProperty(`place_${field}`);
  });
});
