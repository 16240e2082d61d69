import defrosts from '../es/defrosts.json';
import offline from '../es/offline.json';
import openings from '../es/openings.json';
import packages from '../es/packages.json';
import refrigerants from '../es/refrigerants.json';
import reviews from '../es/reviews.json';
import schedules from '../es/schedules.json';
import ui from '../es/ui.json';
import work from '../es/work.json';
import { WORDS as FIRST } from './first-es';

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
