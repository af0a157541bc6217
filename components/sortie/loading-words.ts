/** What a form's figure field means: nothing typed is no figure, anything else is for the schema to judge. */
export function asNumber(value: unknown): number | null {
  return value === "" || value === null || value === undefined ? null : Number(value);
}

export const DAY_PLAN = { daylight: "Daylight", dutyTime: "Duty time", runway: "Runway and its state" } as const;
