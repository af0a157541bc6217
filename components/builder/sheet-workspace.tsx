"use client";
import { useDraggable, useDroppable } from "@dnd-kit/core";
import { GripVertical } from "lucide-react";
import { useEffect, useRef } from "react";
import { SheetPageView } from "@/components/sheet/sheet-page";
import type { CardPoint } from "@/lib/testcards/card";
import type { Finding } from "@/lib/testcards/readiness-types";
import type { SheetPage, SheetRegion } from "@/lib/testcards/sheet-types";
import { type DropSlot, dropSlots } from "./drop-slots";

type WorkspaceProps = {
  pages: SheetPage[];
  points: CardPoint[];
  selected: string | null;
  onSelect: (point: string) => void;
  findings: Finding[];
  carried: string | null; // title of what is being dragged
  readOnly?: boolean;
  moved?: string | null; // just put down: it keeps the focus on whichever page it lands
  code?: boolean[][] | null; // the released sheet's, as it prints
};

/** The card as it will print, page under page, with its points as things to pick up and put down. */
export function SheetWorkspace({
  pages,
  points,
  selected,
  onSelect,
  findings,
  carried,
  readOnly = false,
  code = null,
  moved = null,
}: WorkspaceProps) {
  const here = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const region = selected ? here.current?.querySelector(`[data-region="${selected}"]`) : null;
    region?.scrollIntoView({ block: "nearest" });
  }, [selected]);
  useEffect(() => {
    if (!moved || document.activeElement !== document.body || pages.length === 0) return;
    here.current?.querySelector<HTMLElement>(`[data-region="${moved}"] [data-handle]`)?.focus();
  }, [moved, pages]);
  const slots = readOnly
    ? []
    : dropSlots(
        pages,
        points.map(({ id }) => id),
      );
  return (
    <div ref={here} className="mx-auto flex w-full max-w-[600px] flex-col gap-8">
      {points.length === 0 && !readOnly ? <EmptySheet carried={carried} /> : null}
      {pages.map((page) => (
        <section key={page.number} aria-label={`Page ${page.number} of ${page.of}`} className="relative bg-sheet shadow-sheet">
          <div className="paper">
            <SheetPageView page={page} code={code} />
          </div>
          {page.regions.map((region) => {
            const index = points.findIndex(({ id }) => id === region.point);
            const point = points[index];
            if (!point) return null;
            return (
              <PointRegion
                key={`${region.point}-${region.part}`}
                page={page}
                region={region}
                point={point}
                index={index}
                selected={selected === point.id}
                onSelect={onSelect}
                open={
                  findings.filter(({ where, severity }) => severity === "must" && where.at === "point" && where.point === point.id).length
                }
                readOnly={readOnly}
              />
            );
          })}
          {slots
            .filter((slot) => slot.page === page.number)
            .map((slot) => (
              <Slot key={slot.id} slot={slot} page={page} carried={carried} />
            ))}
        </section>
      ))}
    </div>
  );
}

function percent(part: number, whole: number): string {
  return `${(100 * part) / whole}%`;
}

type RegionProps = {
  page: SheetPage;
  region: SheetRegion;
  point: CardPoint;
  index: number;
  selected: boolean;
  onSelect: (point: string) => void;
  open: number;
  readOnly: boolean;
};

function PointRegion({ page, region, point, index, selected, onSelect, open, readOnly }: RegionProps) {
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, isDragging } = useDraggable({
    id: `${point.id}/${region.part}`,
    data: { from: "card", point: point.id, title: point.title },
    disabled: readOnly,
  });
  const box = {
    left: percent(region.xMm, page.widthMm),
    top: percent(region.yMm, page.heightMm),
    width: percent(region.widthMm, page.widthMm),
    height: percent(region.heightMm, page.heightMm),
  };
  const name = `Point ${index + 1}, ${point.title}`;
  return (
    <div ref={setNodeRef} className="absolute scroll-mt-20" style={box} data-region={region.part === 1 ? point.id : undefined}>
      <button
        type="button"
        aria-pressed={selected}
        aria-label={`${name}${region.parts > 1 ? `, part ${region.part} of ${region.parts}` : ""}: ${readOnly ? "show" : "edit"}`}
        onClick={() => onSelect(point.id)}
        className={`absolute -inset-1 cursor-pointer border-2 transition-colors ${selected ? "border-arc-blue" : "border-transparent hover:border-rule"} ${isDragging ? "bg-wash-blue/60" : ""}`}
      />
      {region.part === 1 && !readOnly ? (
        <button
          type="button"
          ref={setActivatorNodeRef}
          {...listeners}
          {...attributes}
          aria-label={`${name}: move`}
          className="absolute top-0 -left-9 flex h-11 w-8 cursor-grab touch-none items-center justify-center text-ink hover:bg-wash-blue active:cursor-grabbing"
        >
          <GripVertical aria-hidden className="size-5" />
        </button>
      ) : null}
      {region.part === 1 && open > 0 ? (
        <span
          className="pointer-events-none absolute -top-3 -right-3 flex size-6 items-center justify-center bg-arc-red font-bold text-sm text-sheet"
          aria-hidden
        >
          {open}
        </span>
      ) : null}
    </div>
  );
}

function Slot({ slot, page, carried }: { slot: DropSlot; page: SheetPage; carried: string | null }) {
  const { setNodeRef, isOver } = useDroppable({ id: slot.id, data: { at: slot.at } });
  return (
    <div
      ref={setNodeRef}
      className="pointer-events-none absolute right-[5%] left-[5%] flex h-12 -translate-y-1/2 items-center justify-center"
      style={{ top: percent(slot.yMm, page.heightMm) }}
    >
      {isOver && carried ? <DropHere carried={carried} at={slot.at} /> : null}
    </div>
  );
}

function DropHere({ carried, at }: { carried: string; at: number }) {
  return (
    <p className="flex h-full w-full items-center justify-center border-2 border-arc-blue border-dashed bg-wash-blue px-3 text-center text-base text-arc-blue">
      Put “{carried}” here, as point {at + 1}
    </p>
  );
}

function EmptySheet({ carried }: { carried: string | null }) {
  const { setNodeRef, isOver } = useDroppable({ id: "slot-0", data: { at: 0 } });
  return (
    <div
      ref={setNodeRef}
      className="flex min-h-56 items-center justify-center border border-rule border-dashed bg-sheet p-6 text-center shadow-sheet"
    >
      {isOver && carried ? (
        <DropHere carried={carried} at={0} />
      ) : (
        <p className="max-w-72 text-ink-soft">No test points yet. Drag one here from the shelf, or choose “Put on card” beside it.</p>
      )}
    </div>
  );
}
