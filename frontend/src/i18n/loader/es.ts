import offline from '../es/offline.json';
import openings from '../es/openings.json';
import packages from '../es/packages.json';
import reviews from '../es/reviews.json';
import schedules from '../es/schedules.json';
import session from '../es/session.json';
import shell from '../es/shell.json';
import ui from '../es/ui.json';
import work from '../es/work.json';

/** All words of this language, by scope: one chunk, so that a phone without a network has every screen's words. */
export const WORDS = { offline, openings, packages, reviews, schedules, session, shell, ui, work };
