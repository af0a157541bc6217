"use client";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { Problem } from "@/components/form/problem";
import { type ApiProblem, callApi } from "@/components/live/call-api";
import { Button, type ButtonVariant } from "@/components/ui/button";
import { Dialog, DialogContent, DialogTrigger } from "@/components/ui/dialog";
import { Input } from "@/components/ui/input";
import { Textarea } from "@/components/ui/textarea";
import type { Finding } from "@/lib/testcards/readiness-types";
import { openMusts, shortDigest } from "@/lib/workflow/card/policy";

type DecisionProps = {
  cardId: string;
  letter: string;
  version: number;
  digest: string;
  findings: Finding[];
  may: Record<"return" | "release" | "withdraw" | "revise", boolean>;
};

/** Release, return, withdraw, revise: each asks what it needs and says why where it is refused. */
export function CardDecisions({ cardId, letter, version, digest, findings, may }: DecisionProps) {
  const musts = openMusts(findings);
  if (!may.return && !may.release && !may.withdraw && !may.revise) return null;
  return (
    <div className="flex flex-col gap-2">
      {may.release ? (
        <SignDialog
          trigger="Release"
          variant="main"
          title={`Release rev ${letter}`}
          description="Your name, role and the time are signed to exactly this card and printed on every page. Your password is asked again."
          path={`/cards/${cardId}/release`}
          body={{ digest }}
          version={version}
          ask="password"
          doing="Releasing"
        >
          <p>
            Digest of what you were shown: <span className="font-mono">{shortDigest(digest)}</span>
          </p>
          {musts.length > 0 ? (
            <p className="text-ink-red">{musts.length} open “must”: the release will be refused until it is mended.</p>
          ) : null}
          <p className="text-ink-soft text-sm">
            A release says that this card was reviewed. It approves no flight; the pilot in command decides.
          </p>
        </SignDialog>
      ) : null}
      {may.return ? (
        <SignDialog
          trigger="Return with a comment"
          variant="outline"
          title="Return to draft"
          description="The author can change the card again and send it anew."
          path={`/cards/${cardId}/return`}
          body={{}}
          version={version}
          ask="comment"
          doing="Returning"
        />
      ) : null}
      {may.withdraw ? (
        <SignDialog
          trigger="Withdraw"
          variant="danger"
          title={`Withdraw rev ${letter}`}
          description="Printed copies are then not in force. A briefed sortie that flies it drops to planned."
          path={`/cards/${cardId}/withdraw`}
          body={{ letter }}
          version={version}
          ask="reason"
          doing="Withdrawing"
        />
      ) : null}
      {may.revise ? <Revise cardId={cardId} /> : null}
    </div>
  );
}

type Ask = "password" | "comment" | "reason";
type SignProps = {
  trigger: string;
  variant: ButtonVariant;
  title: string;
  description: string;
  path: string;
  body: Record<string, unknown>;
  version: number;
  ask: Ask;
  doing: string;
  children?: React.ReactNode;
};
const SENT_AS: Record<Ask, string> = { password: "password", comment: "text", reason: "why" };
const LABELS: Record<Ask, string> = { password: "Your password", comment: "What is to be changed", reason: "Why it is withdrawn" };

function SignDialog({ trigger, variant, title, description, path, body, version, ask, doing, children }: SignProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [typed, setTyped] = useState("");
  const [problem, setProblem] = useState<ApiProblem | null>(null);
  const [busy, setBusy] = useState(false);
  const id = `sign-${ask}`;
  async function send(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    setProblem(null);
    const answer = await callApi(path, { method: "POST", body: { ...body, [SENT_AS[ask]]: typed }, ifMatch: version });
    setBusy(false);
    if (!answer.ok) return setProblem(answer.problem);
    setOpen(false);
    setTyped("");
    router.refresh();
  }
  const findings = (problem?.findings ?? []) as Finding[];
  return (
    <Dialog open={open} onOpenChange={setOpen}>
      <DialogTrigger asChild>
        <Button variant={variant}>{trigger}</Button>
      </DialogTrigger>
      <DialogContent title={title} description={description}>
        {children}
        <form onSubmit={send} className="flex flex-col gap-3">
          <label htmlFor={id} className="font-bold">
            {LABELS[ask]}
          </label>
          {ask === "password" ? (
            <Input
              id={id}
              type="password"
              autoComplete="current-password"
              required
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
            />
          ) : (
            <Textarea id={id} required rows={3} maxLength={1000} value={typed} onChange={(event) => setTyped(event.target.value)} />
          )}
          {problem ? (
            <div role="alert" className="text-ink-red">
              <p>{problem.errors[0]?.message ?? problem.detail}</p>
              {findings.length > 0 ? (
                <ul className="list-disc ps-5">
                  {findings.map(({ code, message }) => (
                    <li key={code + message}>{message}</li>
                  ))}
                </ul>
              ) : null}
            </div>
          ) : null}
          <Button type="submit" variant={variant} disabled={busy}>
            {busy ? `${doing} …` : title}
          </Button>
        </form>
      </DialogContent>
    </Dialog>
  );
}

function Revise({ cardId }: { cardId: string }) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function revise() {
    setBusy(true);
    const answer = await callApi(`/cards/${cardId}/revise`, { method: "POST", body: {}, idempotencyKey: crypto.randomUUID() });
    setBusy(false);
    if (!answer.ok) return setProblem(answer.problem.detail);
    router.push("?");
    router.refresh();
  }
  return (
    <>
      <Button onClick={revise} disabled={busy}>
        {busy ? "Starting …" : "Start the next revision"}
      </Button>
      <Problem text={problem} />
    </>
  );
}
