"use client";
import { DndContext, DragOverlay, KeyboardSensor, MouseSensor, TouchSensor, useSensor, useSensors } from "@dnd-kit/core";
import { Redo2, Undo2 } from "lucide-react";
import { type ReactNode, useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import { v7 as newId } from "uuid";
import { Discussion, type Remark } from "@/components/card/discussion";
import { buttonClass } from "@/components/ui/button";
import type { CardContent, CardIdentity, CardPoint, ProgrammeSnapshot } from "@/lib/testcards/card";
import type { CardContext, Finding } from "@/lib/testcards/readiness-types";
import { build, copyPoint, startBuilder } from "./builder-state";
import { CardSettings } from "./card-settings";
import { announcements, type Carried, dropOf, INSTRUCTIONS } from "./drag-words";
import { nearestSlot, slotByKey } from "./drop-slots";
import { sectionOf } from "./finding-section";
import { FindingsPanel } from "./findings-panel";
import { PointEditor } from "./point-editor/point-editor";
import { SaveProblem, SaveStatus } from "./save-status";
import { SendForReview } from "./send-for-review";
import { SheetWorkspace } from "./sheet-workspace";
import { asOnShelf } from "./shelf-difference";
import { ShelfPanel } from "./shelf-panel";
import { useAutosave } from "./use-autosave";
import { useCardPaper } from "./use-card-paper";
import { useUndoKeys } from "./use-undo-keys";

export type CardBuilderProps = {
  identity: CardIdentity;
  version: number;
  content: CardContent;
  programme: ProgrammeSnapshot;
  context: Omit<CardContext, "widths">;
  shelf: CardPoint[];
  answers: Record<string, string>;
  comments: Remark[];
  beside: ReactNode; // state and revisions, beside the title
};

type Side = { show: "findings" } | { show: "cover" } | { show: "point"; point: string; section: string };
type Pane = "shelf" | "sheet" | "side";

export function CardBuilder(props: CardBuilderProps) {
  const { identity, programme, context, shelf } = props;
  const [state, dispatch] = useReducer(build, null, () => startBuilder(props.content, props.version));
  const [side, setSide] = useState<Side>({ show: "findings" });
  const [pane, setPane] = useState<Pane>("sheet");
  const [moved, setMoved] = useState<string | null>(null);
  const [carried, setCarried] = useState<Carried | null>(null);
  const [answers, setAnswers] = useState(props.answers);
  const focusNext = useRef<string | null>(null);
  const sideRef = useRef<HTMLElement>(null);
  const { content } = state;
  const { card, pages, findings, facts } = useCardPaper({ programme, identity, content, context, state: "draft" });
  useAutosave(identity.id, state, dispatch);
  useUndoKeys(dispatch);

  const onCard = useMemo(() => {
    const counts = new Map<string, number>();
    for (const { template } of content.points) if (template) counts.set(template.code, (counts.get(template.code) ?? 0) + 1);
    return counts;
  }, [content.points]);

  const put = useCallback((template: CardPoint, at: number) => {
    const point = copyPoint(template, newId);
    dispatch({ type: "insert", point, at });
    setSide({ show: "point", point: point.id, section: "" });
  }, []);
  const show = useCallback((next: Side) => {
    setSide(next);
    setPane("side");
  }, []);

  const jump = useCallback(
    (finding: Finding) => {
      const { where } = finding;
      const { section, focus } = sectionOf(where);
      focusNext.current = focus;
      if (where.at === "point") show({ show: "point", point: where.point, section });
      else if (where.at === "card" && where.field !== "points") show({ show: "cover" });
      else if (where.at === "card") setPane("shelf");
    },
    [show],
  );
  useEffect(() => {
    const key = focusNext.current;
    if (!key || side.show === "findings") return;
    focusNext.current = null;
    const fields = [...(sideRef.current?.querySelectorAll<HTMLElement>("[data-focus]") ?? [])];
    const field = fields.find((one) => one.dataset.focus === key) ?? fields.find((one) => one.dataset.focus === key.split(" ")[0]);
    field?.closest("details")?.setAttribute("open", "");
    (field ?? sideRef.current)?.focus();
  }, [side]);

  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 4 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 180, tolerance: 6 } }),
    useSensor(KeyboardSensor, { coordinateGetter: slotByKey }),
  );
  const point = side.show === "point" ? content.points.find(({ id }) => id === side.point) : undefined;
  const index = point ? content.points.indexOf(point) : -1;
  const shelfOf = (one: CardPoint) => shelf.find(({ template }) => template?.code === one.template?.code);
  const must = findings.filter(({ severity }) => severity === "must").length;

  return (
    <DndContext
      id="card-builder"
      sensors={sensors}
      collisionDetection={nearestSlot}
      accessibility={{ announcements, screenReaderInstructions: { draggable: INSTRUCTIONS } }}
      onDragStart={({ active }) => setCarried(active.data.current as Carried)}
      onDragCancel={() => setCarried(null)}
      onDragEnd={({ active, over }) => {
        setCarried(null);
        const drop = dropOf(active.data.current as Carried, over?.data.current?.at as number | undefined, content.points);
        if (drop?.kind === "move") {
          dispatch({ type: "move", point: drop.point, to: drop.to });
          setMoved(drop.point);
        }
        const template = drop?.kind === "insert" ? shelf.find(({ id }) => id === drop.template) : undefined;
        if (template && drop) put(template, drop.to);
      }}
    >
      <div className="sticky top-0 z-20 bg-paper">
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1 border-rule border-b px-4 py-1">
          <div className="flex grow flex-wrap items-center gap-x-4 gap-y-1">
            <h1 className="font-bold text-xl">
              Card {identity.number} <span className="ms-2">{content.title}</span>
            </h1>
            {props.beside}
          </div>
          <div className="flex gap-1">
            <button
              type="button"
              className={buttonClass("quiet")}
              disabled={state.past.length === 0}
              onClick={() => dispatch({ type: "undo" })}
              aria-label={`Undo ${state.past.at(-1)?.what ?? ""}`}
              title="Undo (Ctrl Z)"
            >
              <Undo2 aria-hidden className="size-5" />
            </button>
            <button
              type="button"
              className={buttonClass("quiet")}
              disabled={state.future.length === 0}
              onClick={() => dispatch({ type: "redo" })}
              aria-label={`Do again ${state.future.at(-1)?.what ?? ""}`}
              title="Do again (Ctrl Shift Z)"
            >
              <Redo2 aria-hidden className="size-5" />
            </button>
          </div>
          <SaveStatus save={state.save} version={state.version} />
        </div>
        <nav aria-label="Parts of the builder" className="flex border-rule border-b wide:hidden">
          {(["shelf", "sheet", "side"] as const).map((one) => (
            <button
              key={one}
              type="button"
              aria-pressed={pane === one}
              onClick={() => setPane(one)}
              className="min-h-12 flex-1 border-b-2 border-transparent aria-pressed:border-ink aria-pressed:font-bold"
            >
              {one === "shelf" ? "Shelf" : one === "sheet" ? "Sheet" : `Release (${must})`}
            </button>
          ))}
        </nav>
        <SaveProblem save={state.save} dispatch={dispatch} />
      </div>
      <div className="wide:grid wide:grid-cols-[320px_minmax(0,1fr)_400px]">
        <aside
          className={`border-rule bg-sheet p-4 wide:sticky wide:top-14 wide:block wide:max-h-[calc(100dvh-3.5rem)] wide:overflow-y-auto wide:border-e ${pane === "shelf" ? "" : "hidden"}`}
        >
          <a href="#sheet" className="sr-only focus:not-sr-only focus:mb-2 focus:inline-block focus:underline">
            Skip the shelf, go to the sheet
          </a>
          <ShelfPanel
            shelf={shelf}
            hazards={programme.hazards}
            parameters={programme.parameters}
            onCard={onCard}
            onPut={(template) => put(template, content.points.length)}
          />
        </aside>
        <div id="sheet" tabIndex={-1} className={`px-12 py-6 wide:block ${pane === "sheet" ? "" : "hidden"}`}>
          <SheetWorkspace
            pages={pages}
            points={content.points}
            selected={point?.id ?? null}
            onSelect={(id) => show({ show: "point", point: id, section: "" })}
            findings={findings}
            carried={carried?.title ?? null}
            moved={moved}
          />
        </div>
        <aside
          ref={sideRef}
          tabIndex={-1}
          className={`border-rule bg-sheet p-4 wide:sticky wide:top-14 wide:block wide:max-h-[calc(100dvh-3.5rem)] wide:overflow-y-auto wide:border-s ${pane === "side" ? "" : "hidden"}`}
        >
          <div className="mb-4 flex gap-4 border-rule border-b text-base" role="tablist" aria-label="Beside the sheet">
            <SideTab on={side.show === "findings"} onClick={() => show({ show: "findings" })} label={`Before release (${must})`} />
            <SideTab on={side.show === "cover"} onClick={() => show({ show: "cover" })} label="Cover" />
            {point ? (
              <SideTab
                on={side.show === "point"}
                onClick={() => show({ show: "point", point: point.id, section: "" })}
                label={`Point ${index + 1}`}
              />
            ) : null}
          </div>
          {side.show === "point" && point ? (
            <PointEditor
              key={point.id}
              card={card}
              point={point}
              index={index}
              count={content.points.length}
              shelf={shelfOf(point)}
              newId={newId}
              open={side.section}
              onOpen={(section) => setSide({ show: "point", point: point.id, section })}
              change={(patch, what) => dispatch({ type: "change point", point: point.id, patch, what })}
              onMove={(to) => dispatch({ type: "move", point: point.id, to })}
              onRemove={() => {
                dispatch({ type: "remove", point: point.id });
                setSide({ show: "findings" });
              }}
              onTakeBack={(part) => {
                const original = shelfOf(point);
                if (original)
                  dispatch({
                    type: "change point",
                    point: point.id,
                    patch: asOnShelf(point, original, part, newId),
                    what: `${part} as on the shelf`,
                  });
              }}
            />
          ) : side.show === "cover" ? (
            <CardSettings card={card} content={content} change={(patch, what) => dispatch({ type: "change card", patch, what })} />
          ) : (
            <>
              <FindingsPanel
                findings={findings}
                answers={answers}
                onAnswer={(key, answer) => setAnswers((now) => ({ ...now, [key]: answer }))}
                onJump={jump}
                facts={facts}
              />
              <SendForReview
                cardId={identity.id}
                letter={identity.letter}
                version={state.version}
                saved={state.save.kind === "saved"}
                findings={findings}
                answers={answers}
                empty={content.points.length === 0}
              />
              {props.comments.length > 0 ? (
                <div className="mt-6">
                  <Discussion cardId={identity.id} comments={props.comments} points={content.points} selected={null} may={false} />
                </div>
              ) : null}
            </>
          )}
        </aside>
      </div>
      <output className="sr-only" aria-live="polite" data-testid="builder-said">
        {state.said}
      </output>
      <DragOverlay dropAnimation={null}>
        {carried ? <p className="w-64 border border-ink bg-sheet px-3 py-2 font-bold shadow-sheet">{carried.title}</p> : null}
      </DragOverlay>
    </DndContext>
  );
}

function SideTab({ on, onClick, label }: { on: boolean; onClick: () => void; label: string }) {
  return (
    <button
      type="button"
      role="tab"
      aria-selected={on}
      onClick={onClick}
      className="-mb-px min-h-11 border-transparent border-b-2 aria-selected:border-ink aria-selected:font-bold"
    >
      {label}
    </button>
  );
}
