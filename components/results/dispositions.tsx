"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Problem } from "@/components/form/problem";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Input } from "@/components/ui/input";
import { Select } from "@/components/ui/select";
import { DISPOSITIONS, type Disposition } from "@/lib/testcards/words";

type Disposed = { revisionId: string; id: string; name: string; disposition: Disposition | null; why: string; by: string | null };

export function Dispositions({ sortieId, points, may }: { sortieId: string; points: Disposed[]; may: boolean }) {
  return (
    <ul>
      {points.map((point) => (
        <li key={point.id} className="border-rule border-b py-3">
          {may ? (
            <OnePoint sortieId={sortieId} point={point} />
          ) : (
            <p>{`${point.name}: ${point.disposition ?? "not decided"}${point.why ? `, ${point.why}` : ""}${point.by ? ` (${point.by})` : ""}`}</p>
          )}
        </li>
      ))}
    </ul>
  );
}

function OnePoint({ sortieId, point }: { sortieId: string; point: Disposed }) {
  const router = useRouter();
  const [disposition, setDisposition] = useState<string>(point.disposition ?? "");
  const [why, setWhy] = useState(point.why);
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  async function send() {
    if (disposition === "") return setProblem("Choose accept, repeat or void.");
    setBusy(true);
    setProblem(null);
    const sent = await callApi(`/sorties/${sortieId}/points/${point.id}/disposition`, {
      method: "POST",
      body: { revisionId: point.revisionId, disposition, why },
    });
    setBusy(false);
    if (!sent.ok) return setProblem(sent.problem.errors[0]?.message ?? sent.problem.detail);
    router.refresh();
  }
  return (
    <div className="grid items-center gap-3 hand:grid-cols-[1fr_10rem_1fr_auto]">
      <p>
        {point.name}
        {point.by ? <span className="block text-ink-soft text-sm">{`${point.disposition}, by ${point.by}`}</span> : null}
      </p>
      <Select aria-label={`Disposition of ${point.name}`} value={disposition} onChange={(event) => setDisposition(event.target.value)}>
        <option value="">not decided</option>
        {DISPOSITIONS.map((one) => (
          <option key={one}>{one}</option>
        ))}
      </Select>
      <Input
        aria-label={`Why, ${point.name}`}
        placeholder="Why"
        maxLength={300}
        value={why}
        onChange={(event) => setWhy(event.target.value)}
      />
      <Button disabled={busy} onClick={send}>
        {busy ? "Recording …" : "Record"}
      </Button>
      <Problem text={problem} className="hand:col-span-4" />
    </div>
  );
}
