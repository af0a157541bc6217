import type { FindingPlace } from "@/lib/testcards/readiness-types";

const SECTIONS: Record<string, string> = {
  positions: "entry",
  entry: "entry",
  steps: "steps",
  readings: "readings",
  grid: "readings",
  limits: "limits",
  aborts: "aborts",
  recovery: "recovery",
  completion: "rules",
  objectives: "rules",
  heightFloor: "rules",
  series: "rules",
  durationMin: "",
};

/** Which part of the point editor a finding opens, and the key of the field that gets the focus. */
export function sectionOf(where: FindingPlace): { section: string; focus: string | null } {
  if (where.at === "point") {
    const field = where.field ?? "";
    return { section: SECTIONS[field] ?? "", focus: where.item ? `${field} ${where.item}` : field || null };
  }
  if (where.at === "card") return { section: "", focus: where.field ?? null };
  return { section: "", focus: null };
}
