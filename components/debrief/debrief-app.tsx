"use client";
import { useEffect, useState } from "react";
import { formatInstant } from "@/lib/format/time";
import { DEBRIEF_CAUTION } from "@/lib/testcards/words";
import { DebriefForm } from "./debrief-form";
import { type DraftStore, useLoadedDebrief } from "./use-debrief";

/** The debrief on a phone. The page is the same file for everybody; which sortie it is stands in the address. */
export function DebriefApp({ store }: { store: DraftStore }) {
  const [sortieId, setSortieId] = useState<string | null>(null);
  useEffect(() => setSortieId(window.location.pathname.split("/").at(-1) ?? ""), []);
  const loaded = useLoadedDebrief(sortieId === "debrief" || sortieId === "" ? null : sortieId, store);
  if (sortieId === "debrief" || sortieId === "")
    return (
      <Message title="Which sortie?">
        <p>Open the debrief from the sortie’s page, or from the flight line.</p>
        <Way href="/">Flight line</Way>
      </Message>
    );
  if (loaded.kind === "sign in")
    return (
      <Message title="Sign in first">
        <p>What you typed on this phone is kept and waits for you.</p>
        <Way href={`/sign-in?next=${encodeURIComponent(`/debrief/${sortieId}`)}`}>Sign in</Way>
      </Message>
    );
  if (loaded.kind === "failed")
    return (
      <Message title="This debrief cannot be opened">
        <p>{loaded.why}</p>
        <button
          type="button"
          className="flex min-h-14 items-center justify-center rounded-md border-2 border-ink bg-sheet font-bold"
          onClick={() => window.location.reload()}
        >
          Try again
        </button>
      </Message>
    );
  if (loaded.kind === "loading")
    return (
      <Message title="Debrief">
        <p className="font-bold">{DEBRIEF_CAUTION}</p>
        <p aria-live="polite">Fetching the cards …</p>
      </Message>
    );
  const { pack, draft } = loaded;
  if (pack.submitted)
    return (
      <Message title={pack.submitted.by === pack.me.name ? "Sent" : "Already debriefed"}>
        <p>
          {pack.submitted.by} sent the debrief of sortie {pack.sortie.number} on {formatInstant(pack.submitted.submittedAt)}. Its readings
          are locked.
        </p>
        <Way href={`/programmes/${pack.sortie.programmeId}/sorties/${pack.sortie.id}/results`}>Results</Way>
      </Message>
    );
  if (!pack.mayDebrief)
    return (
      <Message title="Only a pilot may debrief">
        <p>Ask the pilot of the sortie, or somebody in the team with that role.</p>
        <Way href={`/programmes/${pack.sortie.programmeId}/sorties/${pack.sortie.id}`}>The sortie</Way>
      </Message>
    );
  return <DebriefForm pack={pack} first={draft} store={store} />;
}

function Message({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <main className="mx-auto flex max-w-[34rem] flex-col gap-4 px-4 py-10">
      <h1 className="font-bold text-2xl">{title}</h1>
      {children}
    </main>
  );
}

function Way({ href, children }: { href: string; children: React.ReactNode }) {
  return (
    <a className="flex min-h-14 items-center justify-center rounded-md border-2 border-ink bg-spine font-bold text-spine-ink" href={href}>
      {children}
    </a>
  );
}
