/** Ids of the demo: shaped like a UUIDv7, the same at every seeding, one range of numbers a subject. */
const RANGES = {
  team: 1,
  person: 2,
  aircraft: 3,
  programme: 4,
  configuration: 5,
  parameter: 6,
  instrument: 7,
  calibration: 8,
  limit: 9,
  objective: 10,
  hazard: 11,
  "test point": 12,
  abort: 13,
  "step decision": 14,
  session: 15,
  made: 16, // what the use cases mint, in order
  "card point": 17,
  debrief: 18,
  signature: 19,
} as const;

export type SeedSubject = keyof typeof RANGES;

export function seedId(subject: SeedSubject, number: number): string {
  const range = RANGES[subject].toString(16).padStart(4, "0");
  return `01945a00-${range}-7000-8000-${number.toString(16).padStart(12, "0")}`;
}
