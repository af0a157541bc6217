import type { CardContent, CardPoint } from "@/lib/testcards/card";

/** How the card on the screen stands to the card in the database. */
export type SaveState =
  | { kind: "saved" }
  | { kind: "unsaved" }
  | { kind: "saving" }
  | { kind: "retrying"; why: string }
  | { kind: "refused"; why: string; errors: { path: string; message: string }[] }
  | { kind: "stale"; theirs: CardContent; theirVersion: number };

export type BuilderState = {
  content: CardContent;
  version: number; // the one last seen from the server
  past: { content: CardContent; what: string }[];
  future: { content: CardContent; what: string }[];
  lastEdit: string | null; // edits with the same key are one step of undo
  edits: number; // rises with each change, so that a save knows what it holds
  save: SaveState;
  said: string; // for the screen reader
};

export type BuilderAction =
  | { type: "insert"; point: CardPoint; at: number }
  | { type: "move"; point: string; to: number }
  | { type: "remove"; point: string }
  | { type: "change point"; point: string; patch: Partial<CardPoint>; what: string }
  | { type: "change card"; patch: Partial<CardContent>; what: string }
  | { type: "undo" }
  | { type: "redo" }
  | { type: "saving" }
  | { type: "saved"; version: number; edits: number }
  | { type: "save failed"; why: string }
  | { type: "save refused"; why: string; errors: { path: string; message: string }[] }
  | { type: "stale"; theirs: CardContent; theirVersion: number }
  | { type: "take theirs" }
  | { type: "keep mine" };

const UNDO_STEPS = 200;

export function startBuilder(content: CardContent, version: number): BuilderState {
  return { content, version, past: [], future: [], lastEdit: null, edits: 0, save: { kind: "saved" }, said: "" };
}

/** Sets new content as one step of undo; the same key twice running stays one step. */
function edit(state: BuilderState, content: CardContent, what: string, key: string | null, said: string): BuilderState {
  const joins = key !== null && key === state.lastEdit && state.past.length > 0;
  const past = joins ? state.past : [...state.past.slice(1 - UNDO_STEPS), { content: state.content, what }];
  const save: SaveState = state.save.kind === "stale" ? state.save : { kind: "unsaved" };
  return { ...state, content, past, future: [], lastEdit: key, edits: state.edits + 1, save, said };
}

function withPoints(state: BuilderState, points: CardPoint[], what: string): BuilderState {
  return edit(state, { ...state.content, points }, what, null, what);
}

export function build(state: BuilderState, action: BuilderAction): BuilderState {
  const { points } = state.content;
  switch (action.type) {
    case "insert": {
      const at = Math.max(0, Math.min(action.at, points.length));
      return withPoints(
        state,
        [...points.slice(0, at), action.point, ...points.slice(at)],
        `${action.point.title} put in as point ${at + 1}`,
      );
    }
    case "move": {
      const from = points.findIndex((point) => point.id === action.point);
      const moved = points[from];
      if (!moved) return state;
      const rest = points.filter((point) => point.id !== action.point);
      const to = Math.max(0, Math.min(action.to, rest.length));
      if (to === from) return { ...state, said: `${moved.title} stays point ${from + 1}` };
      return withPoints(
        state,
        [...rest.slice(0, to), moved, ...rest.slice(to)],
        `${moved.title} moved from point ${from + 1} to ${to + 1}`,
      );
    }
    case "remove": {
      const gone = points.find((point) => point.id === action.point);
      return gone
        ? withPoints(
            state,
            points.filter((point) => point !== gone),
            `${gone.title} taken off the card`,
          )
        : state;
    }
    case "change point": {
      const changed = points.map((point) => (point.id === action.point ? { ...point, ...action.patch } : point));
      return edit(state, { ...state.content, points: changed }, action.what, `point ${action.point} ${action.what}`, "");
    }
    case "change card":
      return edit(state, { ...state.content, ...action.patch }, action.what, `card ${action.what}`, "");
    case "undo":
      return step(state, "past", "future", "Undone");
    case "redo":
      return step(state, "future", "past", "Done again");
    case "saving":
      return { ...state, save: { kind: "saving" } };
    case "saved":
      return { ...state, version: action.version, save: action.edits === state.edits ? { kind: "saved" } : { kind: "unsaved" } };
    case "save failed":
      return { ...state, save: { kind: "retrying", why: action.why } };
    case "save refused":
      return { ...state, save: { kind: "refused", why: action.why, errors: action.errors } };
    case "stale":
      return { ...state, save: { kind: "stale", theirs: action.theirs, theirVersion: action.theirVersion } };
    case "take theirs": {
      if (state.save.kind !== "stale") return state;
      const { theirs, theirVersion } = state.save;
      const past = [...state.past, { content: state.content, what: "their card loaded" }];
      return {
        ...state,
        content: theirs,
        version: theirVersion,
        past,
        future: [],
        lastEdit: null,
        edits: state.edits + 1,
        save: { kind: "saved" },
        said: "Their card is loaded. Undo brings yours back.",
      };
    }
    case "keep mine": {
      if (state.save.kind !== "stale") return state;
      return {
        ...state,
        version: state.save.theirVersion,
        edits: state.edits + 1,
        save: { kind: "unsaved" },
        said: "Your card is kept and will be saved over theirs.",
      };
    }
  }
}

function step(state: BuilderState, from: "past" | "future", to: "past" | "future", word: string): BuilderState {
  const last = state[from].at(-1);
  if (!last) return { ...state, said: from === "past" ? "Nothing to undo" : "Nothing to redo" };
  const save: SaveState = state.save.kind === "stale" ? state.save : { kind: "unsaved" };
  return {
    ...state,
    content: last.content,
    [from]: state[from].slice(0, -1),
    [to]: [...state[to], { content: state.content, what: last.what }],
    lastEdit: null,
    edits: state.edits + 1,
    save,
    said: `${word}: ${last.what}`,
  };
}

/** A shelf point as it goes on a card: a copy with ids of its own, so that two copies never share one. */
export function copyPoint(template: CardPoint, newId: () => string): CardPoint {
  const readingIds = new Map(template.readings.map((reading) => [reading.id, newId()]));
  return {
    ...template,
    id: newId(),
    entry: template.entry.map((condition) => ({ ...condition, id: newId() })),
    steps: template.steps.map((one) => ({ ...one, id: newId() })),
    readings: template.readings.map((reading) => ({ ...reading, id: readingIds.get(reading.id) ?? newId() })),
    limits: template.limits.map((limit) => ({ ...limit, id: newId(), reading: readingIds.get(limit.reading) ?? limit.reading })),
    aborts: { ...template.aborts, lines: template.aborts.lines.map((line) => ({ ...line, id: newId() })) },
  };
}
