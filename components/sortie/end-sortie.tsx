"use client";
import { useRouter } from "next/navigation";
import { type FormEvent, useId, useState } from "react";
import { Problem } from "@/components/form/problem";
import { callApi } from "@/components/live/call-api";
import { Button, type ButtonVariant } from "@/components/ui/button";
import { Dialog, DialogContent, DialogTrigger } from "@/components/ui/dialog";
import { Textarea } from "@/components/ui/textarea";

type EndProps = {
  trigger: string;
  variant: ButtonVariant;
  title: string;
  description: string;
  label: string;
  path: string;
  required: boolean;
  doing: string;
  version?: number;
};

/** Asks the reason, then ends the sortie; a refusal stands beside what was typed. */
function EndDialog({ trigger, variant, title, description, label, path, required, doing, version }: EndProps) {
  const router = useRouter();
  const id = useId();
  const [open, setOpen] = useState(false);
  const [why, setWhy] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function send(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    setProblem(null);
    const sent = await callApi(path, { method: "POST", body: { why }, ...(version === undefined ? {} : { ifMatch: version }) });
    setBusy(false);
    if (!sent.ok) return setProblem(sent.problem.errors[0]?.message ?? sent.problem.detail);
    setOpen(false);
    router.refresh();
  }
  return (
    <Dialog open={open} onOpenChange={setOpen}>
      <DialogTrigger asChild>
        <Button variant={variant}>{trigger}</Button>
      </DialogTrigger>
      <DialogContent title={title} description={description}>
        <form onSubmit={send} noValidate className="flex flex-col gap-3">
          <label htmlFor={id} className="font-bold">
            {label}
            {required ? null : <span className="font-normal text-ink-soft"> (may be left empty)</span>}
          </label>
          <Textarea
            id={id}
            rows={3}
            maxLength={300}
            required={required}
            aria-invalid={problem ? true : undefined}
            aria-describedby={`${id}-problem`}
            value={why}
            onChange={(event) => setWhy(event.target.value)}
          />
          <div id={`${id}-problem`}>
            <Problem text={problem} />
          </div>
          <Button type="submit" variant={variant} disabled={busy}>
            {busy ? `${doing} …` : title}
          </Button>
        </form>
      </DialogContent>
    </Dialog>
  );
}

export function CancelSortie({ sortieId, number, version }: { sortieId: string; number: number; version: number }) {
  return (
    <EndDialog
      trigger="Cancel the sortie"
      variant="danger"
      title={`Cancel sortie ${number}`}
      description="It is closed without a flight, and every point counts as skipped. It cannot be opened again."
      label="Why it is cancelled"
      path={`/sorties/${sortieId}/cancel`}
      required
      doing="Cancelling"
      version={version}
    />
  );
}

export function CloseSortie({ sortieId, number }: { sortieId: string; number: number }) {
  return (
    <EndDialog
      trigger="Close the sortie"
      variant="main"
      title={`Close sortie ${number}`}
      description="What its points are worth and its step decisions then stand. A hold can still be said."
      label="Closing remark"
      path={`/sorties/${sortieId}/close`}
      required={false}
      doing="Closing"
    />
  );
}
