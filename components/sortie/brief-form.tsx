"use client";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { FindingMark } from "@/components/builder/finding-mark";
import { callApi } from "@/components/live/call-api";
import { Button } from "@/components/ui/button";
import { Input } from "@/components/ui/input";
import type { Finding } from "@/lib/testcards/readiness-types";
import { findingKey } from "@/lib/workflow/card/policy";

type BriefProps = { sortieId: string; lines: string[]; findings: Finding[]; may: boolean; briefed: boolean; kept: Record<string, string> };

/** What was found, answered in one line where it may stand, and the go/no-go lines ticked by the pilot. Any NO stops. */
export function BriefForm({ sortieId, lines, findings, may, briefed, kept }: BriefProps) {
  const router = useRouter();
  const [ticked, setTicked] = useState<Set<string>>(new Set());
  const [answers, setAnswers] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const must = findings.filter(({ severity }) => severity === "must");
  const should = findings.filter(({ severity }) => severity === "should");
  async function brief() {
    setBusy(true);
    setProblem(null);
    const sent = await callApi(`/sorties/${sortieId}/brief`, {
      method: "POST",
      body: { goNoGo: lines.map((line) => ({ line, go: ticked.has(line) })), answers },
    });
    setBusy(false);
    if (!sent.ok) {
      const open = ((sent.problem.findings ?? []) as Finding[]).map(({ message }) => message);
      const said = sent.problem.errors[0]?.message ?? sent.problem.detail;
      return setProblem(open.length > 0 ? `${said.split(":")[0]}: ${open.join(" ")}` : said);
    }
    router.refresh();
  }
  const toggle = (line: string) =>
    setTicked((now) => {
      const next = new Set(now);
      if (!next.delete(line)) next.add(line);
      return next;
    });
  return (
    <div className="flex flex-col gap-6">
      <div>
        <p className="text-ink-soft">
          {must.length} must, {should.length} should
        </p>
        <ul>
          {[...must, ...should].map((finding) => (
            <li key={findingKey(finding) + finding.message} className="flex gap-3 border-rule border-b py-3">
              <FindingMark severity={finding.severity} />
              <div className="min-w-0 grow">
                <p>{finding.message}</p>
                {kept[findingKey(finding)] ? <p className="text-ink-soft text-sm">Answered: {kept[findingKey(finding)]}</p> : null}
                {finding.severity === "should" && may && !briefed ? (
                  <Input
                    className="mt-2"
                    aria-label={`Answer: ${finding.message}`}
                    placeholder="Why it may stand, in one line"
                    maxLength={300}
                    value={answers[findingKey(finding)] ?? ""}
                    onChange={(event) => setAnswers((now) => ({ ...now, [findingKey(finding)]: event.target.value }))}
                  />
                ) : null}
              </div>
            </li>
          ))}
        </ul>
        {findings.length === 0 ? <p className="mt-2">Nothing was found that stands against this brief.</p> : null}
      </div>
      {may && !briefed ? (
        <fieldset>
          <legend className="font-bold">Go / no-go. Any NO stops.</legend>
          {lines.map((line) => (
            <label key={line} className="flex min-h-11 items-center gap-3 border-rule border-b py-1">
              <input type="checkbox" className="size-5 shrink-0 accent-spine" checked={ticked.has(line)} onChange={() => toggle(line)} />
              {line}
            </label>
          ))}
          {problem ? (
            <p role="alert" className="mt-3 text-ink-red">
              {problem}
            </p>
          ) : null}
          <Button variant="main" className="mt-4" disabled={busy} onClick={brief}>
            {busy ? "Recording …" : "Briefed: every line is GO"}
          </Button>
          <p className="mt-2 text-ink-soft text-sm">The record of a brief, not permission to fly. The pilot in command decides.</p>
        </fieldset>
      ) : null}
    </div>
  );
}
