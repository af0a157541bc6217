"use client";
import { useDeferredValue, useMemo, useState } from "react";
import { callApi } from "@/components/live/call-api";
import { classNames } from "@/components/ui/class-names";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import type { DebriefField } from "@/lib/testcards/debrief-types";
import { FlightScreen } from "./flight-screen";
import { LookOverScreen, SquawkScreen } from "./look-over-screen";
import { type DebriefPack, phoneContext } from "./pack";
import { PointScreen } from "./point-screen";
import { SafetyScreen } from "./safety-screen";
import { type Draft, type DraftStore, type Keeping, useDebriefFields, useDraft } from "./use-debrief";

export type ScreenProps = Omit<ReturnType<typeof useDraft>, "keeping" | "markSent"> & {
  pack: DebriefPack;
  fields: DebriefField[];
  errors: Map<string, string>;
};

const KEPT: Record<Keeping, string> = { kept: "Saved on this phone", keeping: "Saving …", full: "NOT saved: this phone is full" };

/** Screen by screen with one thumb: flight, safety, each point, squawks, look over. */
export function DebriefForm({ pack, first, store }: { pack: DebriefPack; first: Draft; store: DraftStore }) {
  const { keeping, markSent, ...held } = useDraft(pack, first, store);
  const { draft, go } = held;
  const { fields, errors } = useDebriefFields(pack, draft);
  const settled = useDeferredValue(draft.debrief);
  const reports = useMemo(() => pack.cards.map(({ document }) => checkDebrief(document, settled, phoneContext(pack))), [pack, settled]);
  const [sending, setSending] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const points = pack.cards.flatMap(({ document }, at) =>
    document.content.points.map((point, index) => ({
      card: document,
      point,
      report: reports[at],
      place: `Point ${index + 1} of ${document.content.points.length}, card ${document.identity.number} rev ${document.identity.letter}`,
    })),
  );
  const screens = [
    { title: "Flight", keys: (key: string) => /^(revisionsFlown|times|fuel|weather)\./.test(key) },
    { title: "Safety", keys: (key: string) => key.startsWith("safety.") },
    ...points.map(({ point }) => ({ title: point.title, keys: (key: string) => key.startsWith(`${point.id}.`) })),
    { title: "Squawks", keys: (key: string) => key.startsWith("squawks.") || key === "comment" },
    { title: "Look over", keys: () => false },
  ];
  const screen = Math.min(draft.screen, screens.length - 1);
  const last = screen === screens.length - 1;
  const props: ScreenProps = { ...held, pack, fields, errors };
  const at = points[screen - 2];
  const move = (to: number) => {
    go(to);
    window.scrollTo(0, 0);
  };

  async function send() {
    setSending(true);
    setProblem(null);
    const answer = await callApi(`/sorties/${pack.sortie.id}/debrief/submit`, {
      method: "POST",
      body: { id: draft.id, content: draft.debrief },
    });
    setSending(false);
    if (answer.ok) return markSent(new Date().toISOString());
    const { status, detail, errors: refused } = answer.problem;
    if (status === 0) setProblem("No connection. Everything is kept on this phone; send it again when there is a signal.");
    else if (status === 401) setProblem("You were signed out meanwhile. Everything is kept on this phone: sign in again, then send.");
    else setProblem([detail, ...refused.slice(0, 3).map(({ message }) => message)].join(" "));
  }

  if (draft.sentAt) return <Sent pack={pack} />;
  return (
    <div className="mx-auto flex min-h-dvh max-w-[34rem] flex-col">
      <header className="bg-spine px-4 py-3 text-spine-ink">
        <div className="flex justify-between gap-3">
          <h1>
            <a href={`/programmes/${pack.sortie.programmeId}/sorties/${pack.sortie.id}`} className="me-2 underline underline-offset-4">
              Leave
            </a>
            {pack.cards.map(({ document }) => `Card ${document.identity.number} rev ${document.identity.letter}`).join(", ")} · sortie{" "}
            {pack.sortie.number}
          </h1>
          <output
            aria-live="polite"
            data-testid="keeping"
            className={classNames("shrink-0", keeping === "full" && "bg-wash-red px-2 font-bold text-ink-red")}
          >
            {KEPT[keeping]}
          </output>
        </div>
        <nav aria-label="Screens" className="mt-2 flex gap-1">
          {screens.map(({ title }, index) => (
            <button
              // biome-ignore lint/suspicious/noArrayIndexKey: screens never change their order
              key={`${index} ${title}`}
              type="button"
              aria-current={index === screen ? "step" : undefined}
              aria-label={`Screen ${index + 1}, ${title}`}
              onClick={() => move(index)}
              className="group flex h-6 flex-1 items-center"
            >
              <span
                className={classNames(
                  "h-1.5 w-full",
                  index === screen ? "bg-spine-ink" : index < screen ? "bg-spine-ink/60" : "bg-spine-ink/25",
                )}
              />
            </button>
          ))}
        </nav>
      </header>
      <main className="flex-1 px-4 py-5">
        {pack.cards[0]?.document.programme.notice ? <p className="mb-4 text-ink-soft">{pack.cards[0].document.programme.notice}</p> : null}
        {screen === 0 ? <FlightScreen {...props} /> : null}
        {screen === 1 ? (
          <>
            <h2 className="mb-4 font-bold text-xl">Safety first</h2>
            <SafetyScreen {...props} />
          </>
        ) : null}
        {at ? (
          <PointScreen
            key={at.point.id}
            {...props}
            card={at.card}
            point={at.point}
            place={at.place}
            lines={at.report?.lines.filter((line) => line.point === at.point.id) ?? []}
          />
        ) : null}
        {screen === screens.length - 2 ? <SquawkScreen {...props} /> : null}
        {last ? (
          <LookOverScreen {...props} go={move} reports={reports} screens={screens} onSend={send} sending={sending} problem={problem} />
        ) : null}
      </main>
      <footer className="sticky bottom-0 grid grid-cols-[1fr_2fr] gap-3 border-rule border-t bg-paper px-4 py-3">
        <button
          type="button"
          disabled={screen === 0}
          onClick={() => move(screen - 1)}
          className="min-h-14 rounded-md border-2 border-ink bg-sheet disabled:border-rule disabled:text-ink-soft"
        >
          Back
        </button>
        {last ? (
          <span />
        ) : (
          <button
            type="button"
            onClick={() => move(screen + 1)}
            className="min-h-14 rounded-md border-2 border-ink bg-spine font-bold text-spine-ink"
          >
            {screen < 1
              ? "Next: safety"
              : screen < points.length + 1
                ? "Next point"
                : screen === points.length + 1
                  ? "Next: squawks"
                  : "Look over"}
          </button>
        )}
      </footer>
    </div>
  );
}

function Sent({ pack }: { pack: DebriefPack }) {
  const { sortie } = pack;
  return (
    <main className="mx-auto flex max-w-[34rem] flex-col gap-4 px-4 py-10">
      <h1 className="font-bold text-2xl">Sent</h1>
      <p>The debrief of sortie {sortie.number} is with the team. The readings are locked.</p>
      <p>Keep the pencilled sheets: they are the original record.</p>
      <a
        className="flex min-h-14 items-center justify-center rounded-md border-2 border-ink bg-spine font-bold text-spine-ink"
        href={`/programmes/${sortie.programmeId}/sorties/${sortie.id}/results`}
      >
        Results
      </a>
    </main>
  );
}
