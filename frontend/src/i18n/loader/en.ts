import defrosts from '../en/defrosts.json';
import offline from '../en/offline.json';
import openings from '../en/openings.json';
import packages from '../en/packages.json';
import refrigerants from '../en/refrigerants.json';
import reviews from '../en/reviews.json';
import schedules from '../en/schedules.json';
import ui from '../en/ui.json';
import work from '../en/work.json';
import { WORDS as FIRST } from './first-en';

/** All words of this language, by scope: in one piece, so that a phone without a network has every screen's words. */
export const WORDS = {
  ...FIRST,
  defrosts,
  offline,
  openings,
  packages,
  refrigerants,
  reviews,
  schedules,
  ui,
  work,
};
