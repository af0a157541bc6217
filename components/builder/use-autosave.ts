"use client";
import { type Dispatch, useEffect, useRef } from "react";
import { callApi } from "@/components/live/call-api";
import type { CardContent } from "@/lib/testcards/card";
import type { BuilderAction, BuilderState } from "./builder-state";

const QUIET_MS = 500;
const RETRY_MS = 3000;

type Saved = { version: number };
type Current = { version: number; content: CardContent };

/** Saves the draft a moment after the last change, one save at a time; a stale one overwrites nothing and is told. */
export function useAutosave(cardId: string, state: BuilderState, dispatch: Dispatch<BuilderAction>): void {
  const busy = useRef(false);
  const { save, edits, content, version } = state;

  useEffect(() => {
    if (busy.current || (save.kind !== "unsaved" && save.kind !== "retrying")) return;
    const wait = save.kind === "retrying" ? RETRY_MS : QUIET_MS;
    const timer = setTimeout(async () => {
      busy.current = true;
      dispatch({ type: "saving" });
      const answer = await callApi<Saved>(`/cards/${cardId}`, { method: "PATCH", body: { content }, ifMatch: version });
      busy.current = false;
      if (answer.ok) dispatch({ type: "saved", version: answer.body.version, edits });
      else if (answer.problem.status === 412) {
        const theirs = await callApi<Current>(`/cards/${cardId}`);
        if (theirs.ok) dispatch({ type: "stale", theirs: theirs.body.content, theirVersion: theirs.body.version });
        else dispatch({ type: "save failed", why: theirs.problem.detail });
      } else if (answer.problem.status === 0 || answer.problem.status >= 500) dispatch({ type: "save failed", why: answer.problem.detail });
      else dispatch({ type: "save refused", why: answer.problem.detail, errors: answer.problem.errors });
    }, wait);
    return () => clearTimeout(timer);
  }, [cardId, content, dispatch, edits, save.kind, version]);

  useEffect(() => {
    if (save.kind === "saved") return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [save.kind]);
}
