import { People1764576000001 } from './0001-people';
import { Plant1764576000002 } from './0002-plant';
import { Records1764576000003 } from './0003-records';
import { BackgroundWork1764576000004 } from './0004-background-work';
import { Levels1764576000005 } from './0005-levels';
import { DefrostPlans1764576000007 } from './0007-defrost-plans';
import { RefrigerantTables1764576000006 } from './0006-refrigerant-tables';

/** In order; a migration is never changed once it has landed. */
export const MIGRATIONS = [
  People1764576000001,
  Plant1764576000002,
  Records1764576000003,
  BackgroundWork1764576000004,
  Levels1764576000005,
  RefrigerantTables1764576000006,
  DefrostPlans1764576000007,
];
