"use client";
import { Check, Minus } from "lucide-react";
import { useState } from "react";
import { Input } from "@/components/ui/input";
import type { Finding } from "@/lib/testcards/readiness-types";
import { findingKey } from "@/lib/workflow/card/policy";
import { FindingMark } from "./finding-mark";
import type { CardFact } from "./use-card-paper";

type PanelProps = {
  findings: Finding[];
  answers: Record<string, string>;
  onAnswer: (key: string, answer: string) => void;
  onJump: (finding: Finding) => void;
  facts: CardFact[];
  readOnly?: boolean;
  title?: string;
};

export function FindingsPanel({ findings, answers, onAnswer, onJump, facts, readOnly = false, title = "Before release" }: PanelProps) {
  const must = findings.filter(({ severity }) => severity === "must");
  const should = findings.filter(({ severity }) => severity === "should");
  return (
    <section aria-label="Before release">
      <h2 className="font-bold text-lg">{title}</h2>
      <p className="mb-2 text-sm text-ink-soft" aria-live="polite" data-testid="finding-count">
        {must.length} must, {should.length} should
      </p>
      <ul>
        {[...must, ...should].map((finding) => (
          <FindingRow
            key={findingKey(finding) + finding.message}
            finding={finding}
            answer={answers[findingKey(finding)] ?? ""}
            onAnswer={onAnswer}
            onJump={onJump}
            readOnly={readOnly}
          />
        ))}
        {facts.map(({ text, well }) => (
          <li key={text} className="flex gap-3 border-rule border-b py-3">
            {well ? (
              <Check aria-label="well" className="mt-0.5 size-5 shrink-0 text-ink-green" />
            ) : (
              <Minus aria-label="not yet" className="mt-0.5 size-5 shrink-0 text-ink-red" />
            )}
            <span>{text}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

type RowProps = {
  finding: Finding;
  answer: string;
  onAnswer: (key: string, answer: string) => void;
  onJump: (finding: Finding) => void;
  readOnly: boolean;
};

function FindingRow({ finding, answer, onAnswer, onJump, readOnly }: RowProps) {
  const [open, setOpen] = useState(answer !== "");
  const key = findingKey(finding);
  return (
    <li className="border-rule border-b py-3" data-finding={finding.code}>
      <div className="flex gap-3">
        <FindingMark severity={finding.severity} />
        <div className="min-w-0 flex-1">
          <button type="button" onClick={() => onJump(finding)} className="block w-full text-left underline-offset-4 hover:underline">
            {finding.message}
          </button>
          {finding.severity === "should" && !readOnly && !open ? (
            <button type="button" className="mt-1 min-h-6 text-sm text-ink-soft underline underline-offset-4" onClick={() => setOpen(true)}>
              Answer in one line
            </button>
          ) : null}
          {finding.severity === "should" && open ? (
            <Input
              className="mt-2"
              aria-label={`Answer: ${finding.message}`}
              placeholder="Why it may stand"
              maxLength={200}
              value={answer}
              readOnly={readOnly}
              onChange={(event) => onAnswer(key, event.target.value)}
            />
          ) : null}
        </div>
      </div>
    </li>
  );
}
