"use client";
import { useState } from "react";
import { Problem } from "@/components/form/problem";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";

/** Records the print, then opens the sheet. */
export function PrintSheet({ cardId, letter, disabled = false }: { cardId: string; letter: string; disabled?: boolean }) {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const [link, setLink] = useState<string | null>(null);
  async function print() {
    setBusy(true);
    setProblem(null);
    const answer = await callApi<{ href: string }>(`/cards/${cardId}/revisions/${letter}/prints`, {
      method: "POST",
      body: { paper: "a5" },
      idempotencyKey: crypto.randomUUID(),
    });
    setBusy(false);
    if (!answer.ok) return setProblem(answer.problem.detail);
    setLink(answer.body.href);
    window.open(answer.body.href, "_blank", "noopener");
  }
  return (
    <>
      <Button onClick={print} disabled={busy || disabled}>
        {busy ? "Drawing the sheet …" : "Print kneeboard sheet"}
      </Button>
      {link ? (
        <a className="underline underline-offset-4" href={link} target="_blank" rel="noopener">
          Open the sheet (PDF, A5)
        </a>
      ) : null}
      <Problem text={problem} />
    </>
  );
}
