"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Problem } from "@/components/form/problem";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import type { Finding } from "@/lib/testcards/readiness-types";
import { openMusts, unanswered } from "@/lib/workflow/card/policy";
import { PrintSheet } from "./print-sheet";

type SendProps = {
  cardId: string;
  letter: string;
  version: number;
  saved: boolean;
  findings: Finding[];
  answers: Record<string, string>;
  empty: boolean;
};

/** Says what still stands in the way instead of a dead button; the server decides again. */
export function SendForReview({ cardId, letter, version, saved, findings, answers, empty }: SendProps) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const musts = openMusts(findings).length;
  const silent = unanswered(findings, answers).length;
  async function send() {
    if (empty) return setProblem("Put at least one test point on the card first.");
    if (musts > 0) return setProblem(`Mend ${musts === 1 ? "the one “must”" : `the ${musts} “must” findings`} first.`);
    if (silent > 0)
      return setProblem(
        `Answer ${silent === 1 ? "the open “should”" : `the ${silent} open “should” findings`} in one line each, or mend them.`,
      );
    if (!saved) return setProblem("The last change is not saved yet. Try again in a moment.");
    setBusy(true);
    setProblem(null);
    const answer = await callApi(`/cards/${cardId}/submit`, { method: "POST", body: { answers }, ifMatch: version });
    if (answer.ok) return router.refresh();
    setBusy(false);
    setProblem(answer.problem.detail);
  }
  return (
    <div className="mt-4 flex flex-col gap-2">
      <Button variant="main" onClick={send} disabled={busy}>
        {busy ? "Sending …" : "Send for review"}
      </Button>
      <Problem text={problem} />
      <PrintSheet cardId={cardId} letter={letter} disabled={!saved} />
    </div>
  );
}
