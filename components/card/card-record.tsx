"use client";
import { useMemo, useState } from "react";
import { FindingsPanel } from "@/components/builder/findings-panel";
import { PrintSheet } from "@/components/builder/print-sheet";
import { SheetWorkspace } from "@/components/builder/sheet-workspace";
import { formatInstant } from "@/lib/format/time";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import type { CardDocument } from "@/lib/testcards/card";
import type { Finding } from "@/lib/testcards/readiness-types";
import { layOutSheet } from "@/lib/testcards/sheet";
import type { SheetStamp } from "@/lib/testcards/sheet-types";
import type { CardState } from "@/lib/testcards/words";
import { CardDecisions } from "./card-decisions";
import { Discussion, type Remark } from "./discussion";
import { RisksAndChanges } from "./risks-and-changes";

export type CardRecordView = {
  card: { id: string; number: string };
  revision: {
    id: string;
    letter: string;
    state: CardState;
    version: number;
    answers: Record<string, string>;
    authorName: string;
    submittedAt: string | null;
    endedWhy: string | null;
    endedAt: string | null;
  };
  document: CardDocument;
  digest: string;
  findings: Finding[];
  comments: Remark[];
  differences: { point: string; parts: string[] }[]; // from the shelf as it is now
  stamp: SheetStamp | null;
  code: boolean[][] | null;
  may: Record<"edit" | "submit" | "comment" | "return" | "release" | "withdraw" | "revise" | "print", boolean>;
};

/** A revision that is not being written: the sheet as it prints, what was found, what was said, and what may be done. */
export function CardRecord({ view }: { view: CardRecordView }) {
  const { card, revision, document, digest, findings, comments, differences, stamp, code, may } = view;
  const [selected, setSelected] = useState<string | null>(null);
  const pages = useMemo(
    () => layOutSheet(document, { paper: "a5", state: revision.state, widths: B612_WIDTHS, stamp }),
    [document, revision.state, stamp],
  );
  const { points } = document.content;
  const jump = ({ where }: Finding) => {
    if (where.at === "point") setSelected(where.point);
  };
  const frozen = revision.state !== "in review" && revision.state !== "draft";
  return (
    <div className="border-rule border-t wide:grid wide:grid-cols-[minmax(0,1fr)_420px]">
      <div className="px-1 py-6 hand:px-12">
        <SheetWorkspace
          pages={pages}
          points={points}
          selected={selected}
          onSelect={setSelected}
          findings={frozen ? [] : findings}
          carried={null}
          code={code}
          readOnly
        />
      </div>
      <aside className="flex flex-col gap-6 border-rule bg-sheet p-4 wide:border-s">
        <p>
          Written by {revision.authorName}
          {revision.submittedAt ? `, sent for review ${formatInstant(revision.submittedAt)}` : ""}.
        </p>
        {stamp ? (
          <p>
            Released by {stamp.name} ({stamp.role}), {formatInstant(stamp.at)}.<br />
            <span className="text-ink-soft text-sm">
              Digest <span className="font-mono">{stamp.shortDigest}</span>, code <span className="font-mono">{stamp.code}</span>
            </span>
          </p>
        ) : null}
        {revision.endedWhy && revision.endedAt ? (
          <p className="border border-arc-red bg-wash-red p-3">
            <span className="font-bold">{revision.state === "withdrawn" ? "Withdrawn" : "Superseded"}</span>{" "}
            {formatInstant(revision.endedAt)}: {revision.endedWhy}
          </p>
        ) : null}
        <CardDecisions cardId={card.id} letter={revision.letter} version={revision.version} digest={digest} findings={findings} may={may} />
        {may.print ? (
          <div className="flex flex-col gap-2">
            <PrintSheet cardId={card.id} letter={revision.letter} />
            {revision.state === "released" ? null : (
              <p className="text-ink-soft text-sm">
                Prints with {revision.state === "in review" ? "DRAFT" : revision.state.toUpperCase()} across every page.
              </p>
            )}
          </div>
        ) : null}
        <FindingsPanel
          findings={findings}
          answers={revision.answers}
          onAnswer={() => {}}
          onJump={jump}
          facts={findings.length === 0 ? [{ text: "Nothing was found that should keep this card from release.", well: true }] : []}
          readOnly
          title={frozen ? "Found at release" : "Before release"}
        />
        <RisksAndChanges document={document} differences={differences} />
        <Discussion cardId={card.id} comments={comments} points={points} selected={selected} may={may.comment} />
      </aside>
    </div>
  );
}
