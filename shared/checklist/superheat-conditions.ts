/** What has to be so for a superheat to mean anything. Each is said by whoever reads, none is inferred. */
export const SUPERHEAT_CONDITIONS = [
  'pastDefrost',
  'coilClear',
  'liquidFeeding',
  'airInReach',
  'suctionAtSetPoint',
] as const;
export type SuperheatCondition = (typeof SUPERHEAT_CONDITIONS)[number];

/** What a valve is given to settle after a turn where the template says nothing; manuals say 15 and 30 minutes. */
export const DEFAULT_WAIT_S = 900;
