import type { Announcements } from "@dnd-kit/core";
import type { CardPoint } from "@/lib/testcards/card";

/** What is being dragged: a template from the shelf or a point of the card. */
export type Carried = { title: string } & ({ from: "shelf"; template: string } | { from: "card"; point: string });

export type Drop = { kind: "insert"; template: string; to: number } | { kind: "move"; point: string; to: number };

/** Where a drop at a slot puts the point; a point that moves down leaves a gap behind it. */
export function dropOf(carried: Carried, slot: number | undefined, points: CardPoint[]): Drop | null {
  if (slot === undefined) return null;
  if (carried.from === "shelf") return { kind: "insert", template: carried.template, to: slot };
  const from = points.findIndex(({ id }) => id === carried.point);
  return { kind: "move", point: carried.point, to: slot > from ? slot - 1 : slot };
}

export const INSTRUCTIONS =
  "Press space to pick the test point up, the arrow keys to choose its place on the card, space to put it down, escape to leave it.";

const titleOf = (data: { current?: unknown } | undefined) => (data?.current as Carried | undefined)?.title ?? "The point";
const placeOf = (data: { current?: unknown } | undefined) => ((data?.current as { at?: number } | undefined)?.at ?? 0) + 1;

export const announcements: Announcements = {
  onDragStart: ({ active }) => `${titleOf(active.data)} picked up.`,
  onDragOver: ({ active, over }) =>
    over ? `${titleOf(active.data)}: place ${placeOf(over.data)}.` : `${titleOf(active.data)} is off the card.`,
  onDragEnd: ({ active, over }) =>
    over ? `${titleOf(active.data)} put down at place ${placeOf(over.data)}.` : `${titleOf(active.data)} left where it was.`,
  onDragCancel: ({ active }) => `${titleOf(active.data)} left where it was.`,
};
