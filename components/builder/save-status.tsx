"use client";
import { Button } from "@/components/ui/button";
import type { BuilderAction, SaveState } from "./builder-state";

/** Always says how the card on the screen stands to the one in the database. */
export function SaveStatus({ save, version }: { save: SaveState; version: number }) {
  const words: Record<SaveState["kind"], string> = {
    saved: `Saved, version ${version}`,
    unsaved: "Not saved yet",
    saving: "Saving …",
    retrying: "Not saved: no connection. Trying again.",
    refused: "Not saved: something cannot be used",
    stale: "Not saved: changed by someone else",
  };
  const bad = save.kind === "retrying" || save.kind === "refused" || save.kind === "stale";
  return (
    <output aria-live="polite" data-testid="save-status" className={bad ? "font-bold text-ink-red text-sm" : "text-ink-soft text-sm"}>
      {words[save.kind]}
    </output>
  );
}

export function SaveProblem({ save, dispatch }: { save: SaveState; dispatch: (action: BuilderAction) => void }) {
  if (save.kind === "stale")
    return (
      <div role="alert" className="border border-arc-red bg-wash-red p-4 text-ink">
        <p className="font-bold">This card was saved from elsewhere meanwhile, as version {save.theirVersion}.</p>
        <p className="mt-1">
          Nothing of theirs was overwritten and nothing of yours is lost. Load their card (undo brings yours back), or keep yours and save
          it over theirs.
        </p>
        <div className="mt-3 flex flex-wrap gap-2">
          <Button variant="main" onClick={() => dispatch({ type: "take theirs" })}>
            Load their card
          </Button>
          <Button onClick={() => dispatch({ type: "keep mine" })}>Keep mine</Button>
        </div>
      </div>
    );
  if (save.kind === "refused")
    return (
      <div role="alert" className="border border-arc-red bg-wash-red p-4 text-ink">
        <p className="font-bold">This cannot be saved as it stands. It is kept here; change it and it saves by itself.</p>
        <ul className="mt-1 list-disc ps-5">
          {save.errors.length > 0 ? (
            save.errors.slice(0, 5).map(({ path, message }) => <li key={path}>{`${path}: ${message}`}</li>)
          ) : (
            <li>{save.why}</li>
          )}
        </ul>
      </div>
    );
  return null;
}
