"use client";
import { useRouter } from "next/navigation";
import { useId, useState } from "react";
import { Problem } from "@/components/form/problem";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Input } from "@/components/ui/input";

type AnswerProps = { sortieId: string; revisionId: string; digest: string; answered: "accepted" | "declined" | null };

/** The pilot's yes or no to exactly this card. A no needs a line, not a defence. */
export function AnswerCard({ sortieId, revisionId, digest, answered }: AnswerProps) {
  const router = useRouter();
  const id = useId();
  const [declining, setDeclining] = useState(false);
  const [why, setWhy] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function send(answer: "accepted" | "declined") {
    setBusy(true);
    setProblem(null);
    const sent = await callApi(`/sorties/${sortieId}/cards/${revisionId}/acceptance`, { method: "POST", body: { digest, answer, why } });
    setBusy(false);
    if (!sent.ok) return setProblem(sent.problem.errors[0]?.message ?? sent.problem.detail);
    setDeclining(false);
    router.refresh();
  }
  return (
    <div className="flex flex-col gap-2">
      <div className="flex flex-wrap gap-2">
        {answered === "accepted" ? null : (
          <Button variant="main" disabled={busy} onClick={() => send("accepted")}>
            I have read it and accept it
          </Button>
        )}
        {answered === "declined" ? null : (
          <Button disabled={busy} aria-expanded={declining} onClick={() => setDeclining(!declining)}>
            {answered === "accepted" ? "Take the acceptance back" : "Decline"}
          </Button>
        )}
      </div>
      {declining ? (
        <div className="flex flex-col gap-2">
          <label htmlFor={id}>Why, in one line</label>
          <Input id={id} value={why} maxLength={300} onChange={(event) => setWhy(event.target.value)} />
          <Button disabled={busy} onClick={() => send("declined")}>
            Send
          </Button>
        </div>
      ) : null}
      <Problem text={problem} />
    </div>
  );
}
