/** What has to be so for a superheat to mean anything. Each is said by whoever reads, none is inferred. */
export const SUPERHEAT_CONDITIONS = [
  'pastDefrost',
  'coilClear',
  'liquidFeeding',
  'airInReach',
  'suctionAtSetPoint',
] as const;
export type SuperheatCondition = (typeof SUPERHEAT_CONDITIONS)[number];
