import { People1764576000001 } from './0001-people';
import { Plant1764576000002 } from './0002-plant';
import { Records1764576000003 } from './0003-records';
import { BackgroundWork1764576000004 } from './0004-background-work';

/** In order; a migration is never changed once it has landed. */
export const MIGRATIONS = [
  People1764576000001,
  Plant1764576000002,
  Records1764576000003,
  BackgroundWork1764576000004,
];
