import offline from '../en/offline.json';
import openings from '../en/openings.json';
import packages from '../en/packages.json';
import reviews from '../en/reviews.json';
import schedules from '../en/schedules.json';
import session from '../en/session.json';
import shell from '../en/shell.json';
import ui from '../en/ui.json';
import work from '../en/work.json';

/** All words of this language, by scope: one chunk, so that a phone without a network has every screen's words. */
export const WORDS = { offline, openings, packages, reviews, schedules, session, shell, ui, work };
