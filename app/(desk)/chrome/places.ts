import { BookOpen, ClipboardList, Gauge, type LucideIcon, Plane, Shapes, TrendingUp, Users, Wrench } from "lucide-react";
import type { Role } from "@/lib/testcards/words";

export type PlaceName = "programme" | "limits" | "test-points" | "cards" | "sorties" | "squawks" | "ladder" | "team";
export type Place = { name: PlaceName; label: string; icon: LucideIcon };

/** The binder's tabs, in their order. */
export const TABS: Place[] = [
  { name: "programme", label: "Programme", icon: BookOpen },
  { name: "limits", label: "Limits", icon: Gauge },
  { name: "test-points", label: "Test points", icon: Shapes },
  { name: "cards", label: "Cards", icon: ClipboardList },
  { name: "sorties", label: "Sorties", icon: Plane },
  { name: "squawks", label: "Squawks", icon: Wrench },
];

export const PLACES: Place[] = [
  ...TABS,
  { name: "ladder", label: "Ladder", icon: TrendingUp },
  { name: "team", label: "Team", icon: Users },
];

/** What each role needs most, for the thumb. */
const MOST: Record<Role, [PlaceName, PlaceName, PlaceName]> = {
  pilot: ["sorties", "cards", "squawks"],
  engineer: ["cards", "sorties", "squawks"],
  reviewer: ["cards", "ladder", "sorties"],
  mechanic: ["squawks", "programme", "sorties"],
  admin: ["team", "programme", "cards"],
  observer: ["sorties", "cards", "programme"],
};
/** With several roles, the one that works nearest to the aircraft decides. */
const NEAREST: Role[] = ["pilot", "mechanic", "engineer", "reviewer", "observer", "admin"];

export function placesFor(roles: readonly Role[]): Place[] {
  const role = NEAREST.find((each) => roles.includes(each)) ?? "observer";
  return MOST[role].flatMap((name) => PLACES.find((place) => place.name === name) ?? []);
}

export function addressOf(place: PlaceName, programmeId: string): string {
  if (place === "team") return "/team";
  return place === "programme" ? `/programmes/${programmeId}` : `/programmes/${programmeId}/${place}`;
}

/** Which tab a path lies under; the ladder is kept with the programme. */
export function placeOf(path: string): PlaceName | null {
  const [, first, , third] = path.split("/");
  if (first === "team") return "team";
  if (first !== "programmes") return null;
  return PLACES.find((place) => place.name === third)?.name ?? "programme";
}
