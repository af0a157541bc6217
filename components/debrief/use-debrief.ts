"use client";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { v7 as newId } from "uuid";
import { callApi } from "@/components/live/call-api";
import { debriefModel } from "@/lib/testcards/debrief";
import { emptyDebrief } from "@/lib/testcards/debrief-blank";
import type { Debrief, DebriefField } from "@/lib/testcards/debrief-types";
import { validateDebrief } from "@/lib/testcards/validate-debrief";
import { readTyped, withValue } from "./field-value";
import type { DebriefPack } from "./pack";

export type Draft = { id: string; debrief: Debrief; typed: Record<string, string>; screen: number; savedAt: string; sentAt: string | null };

/** Where drafts are kept; handed in by the page, so that the form knows no storage. */
export type DraftStore = {
  load: (person: string, sortie: string) => Promise<Draft | undefined>;
  save: (person: string, sortie: string, draft: Draft) => Promise<void>;
  loadPack: <Pack>(sortie: string) => Promise<Pack | undefined>;
  savePack: <Pack>(sortie: string, pack: Pack) => Promise<void>;
};

export type Loaded =
  | { kind: "loading" }
  | { kind: "sign in" }
  | { kind: "failed"; why: string }
  | { kind: "ready"; pack: DebriefPack; draft: Draft; online: boolean };

/** Fetches the sortie, or takes what the phone kept of it, and finds the draft this person began. */
export function useLoadedDebrief(sortieId: string | null, store: DraftStore): Loaded {
  const [loaded, setLoaded] = useState<Loaded>({ kind: "loading" });
  useEffect(() => {
    if (sortieId === null) return;
    let left = false;
    const show = (next: Loaded) => {
      if (!left) setLoaded(next);
    };
    (async () => {
      const answer = await callApi<DebriefPack>(`/sorties/${sortieId}/debrief`);
      if (!answer.ok && answer.problem.status === 401) return show({ kind: "sign in" });
      if (!answer.ok && answer.problem.status !== 0) return show({ kind: "failed", why: answer.problem.detail });
      const pack = answer.ok ? answer.body : await store.loadPack<DebriefPack>(sortieId);
      if (!pack)
        return show({ kind: "failed", why: "There is no signal and this sortie is not on this phone yet. Open it once with a signal." });
      if (answer.ok) await store.savePack(sortieId, pack).catch(() => undefined);
      const kept = await store.load(pack.me.id, sortieId).catch(() => undefined);
      const draft = kept ?? {
        id: newId(),
        debrief: emptyDebrief(
          pack.cards.map(({ document }) => document),
          pack.sortie.kind,
        ),
        typed: {},
        screen: 0,
        savedAt: "",
        sentAt: null,
      };
      show({ kind: "ready", pack, draft, online: answer.ok });
    })();
    return () => {
      left = true;
    };
  }, [sortieId, store]);
  return loaded;
}

export type Keeping = "kept" | "keeping" | "full";

/** The draft on the screen; each change goes to the phone's storage at once. */
export function useDraft(pack: DebriefPack, first: Draft, store: DraftStore) {
  const [draft, setDraft] = useState(first);
  const [keeping, setKeeping] = useState<Keeping>("kept");
  const written = useRef(first);
  const queue = useRef<Promise<void>>(Promise.resolve());
  useEffect(() => {
    if (draft === written.current) return;
    written.current = draft;
    setKeeping("keeping");
    queue.current = queue.current
      .then(() => store.save(pack.me.id, pack.sortie.id, { ...draft, savedAt: new Date().toISOString() }))
      .then(() => setKeeping("kept"))
      .catch(() => setKeeping("full"));
  }, [draft, pack, store]);

  const change = useCallback((edit: (debrief: Debrief) => Debrief) => setDraft((now) => ({ ...now, debrief: edit(now.debrief) })), []);
  const type = useCallback((field: DebriefField, text: string, unit: Parameters<typeof withValue>[3] = null) => {
    setDraft((now) => ({
      ...now,
      typed: { ...now.typed, [field.key]: text },
      debrief: withValue(now.debrief, field, readTyped(field, text).value, unit),
    }));
  }, []);
  const keepTyped = useCallback((key: string, text: string) => setDraft((now) => ({ ...now, typed: { ...now.typed, [key]: text } })), []);
  const go = useCallback((screen: number) => setDraft((now) => ({ ...now, screen })), []);
  const markSent = useCallback((at: string) => setDraft((now) => ({ ...now, sentAt: at })), []);
  return { draft, keeping, change, type, keepTyped, go, markSent };
}

/** All fields of all cards, and what is wrong with the debrief as it stands, by field key. */
export function useDebriefFields(pack: DebriefPack, draft: Draft) {
  const fields = useMemo(
    () =>
      pack.cards.flatMap(({ document }, index) =>
        debriefModel(document).filter((field) => index === 0 || field.section === "point" || field.part === "revision"),
      ),
    [pack],
  );
  const errors = useMemo(() => {
    const found = new Map<string, string>();
    for (const { document } of pack.cards) for (const { key, message } of validateDebrief(document, draft.debrief)) found.set(key, message);
    for (const field of fields) {
      const problem = readTyped(field, draft.typed[field.key] ?? "").problem;
      if (problem && (field.kind === "number" || field.kind === "count" || field.kind === "duration" || field.kind === "time of day"))
        found.set(field.key, problem);
    }
    return found;
  }, [fields, pack, draft]);
  return { fields, errors };
}
