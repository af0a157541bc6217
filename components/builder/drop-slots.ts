import type { ClientRect, CollisionDetection, KeyboardCoordinateGetter } from "@dnd-kit/core";
import type { SheetPage } from "@/lib/testcards/sheet-types";

/** A place between points where one can be put: `at` is the index the point will have. */
export type DropSlot = { id: string; at: number; page: number; yMm: number };

const ABOVE_MM = 2;

/** One slot before each point and one after the last, where the sheet shows them. */
export function dropSlots(pages: SheetPage[], pointIds: string[]): DropSlot[] {
  const slots = pointIds.flatMap((point, at) => {
    const page = pages.find(({ regions }) => regions.some((region) => region.point === point && region.part === 1));
    const region = page?.regions.find((one) => one.point === point && one.part === 1);
    return page && region ? [{ id: slotId(at), at, page: page.number, yMm: region.yMm - ABOVE_MM }] : [];
  });
  const last = pages.findLast(({ regions }) => regions.length > 0);
  const lastRegion = last?.regions.at(-1);
  if (last && lastRegion)
    slots.push({
      id: slotId(pointIds.length),
      at: pointIds.length,
      page: last.number,
      yMm: lastRegion.yMm + lastRegion.heightMm + ABOVE_MM,
    });
  return slots;
}

export function slotId(at: number): string {
  return `slot-${at}`;
}

function middle(rect: ClientRect): number {
  return rect.top + rect.height / 2;
}

const SIDE_REACH_PX = 80;

/** The slot nearest by height; with a pointer, only while it is over the sheet's column. */
export const nearestSlot: CollisionDetection = ({ droppableContainers, droppableRects, pointerCoordinates, collisionRect }) => {
  const y = pointerCoordinates?.y ?? collisionRect.top;
  const near = droppableContainers.flatMap((container) => {
    const rect = droppableRects.get(container.id);
    if (!rect) return [];
    const x = pointerCoordinates?.x;
    if (x !== undefined && (x < rect.left - SIDE_REACH_PX || x > rect.right + SIDE_REACH_PX)) return [];
    return [{ id: container.id, data: { droppableContainer: container, value: Math.abs(y - middle(rect)) } }];
  });
  return near.sort((a, b) => a.data.value - b.data.value);
};

/** Arrow keys go from slot to slot, whether the point comes from the shelf or from the card. */
export const slotByKey: KeyboardCoordinateGetter = (event, { context: { droppableContainers, droppableRects, over } }) => {
  const steps: Record<string, number> = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 };
  const by = steps[event.code];
  if (by === undefined) return undefined;
  event.preventDefault();
  const rects = droppableContainers
    .getEnabled()
    .flatMap(({ id }) => {
      const rect = droppableRects.get(id);
      return rect ? [{ id, rect }] : [];
    })
    .sort((a, b) => middle(a.rect) - middle(b.rect));
  const now = rects.findIndex(({ id }) => id === over?.id);
  const next = rects[Math.max(0, Math.min(now + by, rects.length - 1))];
  return next && { x: next.rect.left, y: middle(next.rect) };
};
