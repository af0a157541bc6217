import Link from "next/link";
import { CardResults } from "@/components/results/card-results";
import { Dispositions } from "@/components/results/dispositions";
import { RawDebrief } from "@/components/results/raw-debrief";
import { CloseSortie } from "@/components/sortie/end-sortie";
import { SortieStateBadge } from "@/components/sortie/sortie-state";
import { Badge } from "@/components/ui/badge";
import { PageHeader, Section } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatInstant } from "@/lib/format/time";
import { asSentences } from "@/lib/format/words";
import { SHEET_CAUTION } from "@/lib/testcards/words";
import { getSortieResults, type SortieResults } from "@/lib/workflow/sortie/queries";
import { orNotFound } from "../../../../../or-not-found";
import { BinderPage } from "../../../binder-page";
import { StepSection } from "./step-section";

export const metadata = { title: "Results" };

type Props = { params: Promise<{ programme: string; sortie: string }>; searchParams: Promise<{ version?: string }> };

/** Raw beside derived: what was read, what it means on the day, on a hot day, and what follows. */
export default async function ResultsPage({ params, searchParams }: Props) {
  const { programme, sortie: id } = await params;
  const { version } = await searchParams;
  const { db, actor } = await requestCtx();
  const asked = version && /^\d{1,6}$/.test(version) ? { version: Number(version) } : {};
  const results = orNotFound(() => getSortieResults(db, actor, id, asked));
  const { sortie, debrief, checks, versions, may } = results;
  const here = `/programmes/${programme}/sorties/${id}`;
  return (
    <BinderPage wide>
      <PageHeader
        title={`Results of sortie ${sortie.number}`}
        badge={<SortieStateBadge state={sortie.state} />}
        lead={
          <>
            <Link className="underline underline-offset-4" href={here}>
              {sortie.kind}
            </Link>
            , debriefed by {debrief.submittedByName}, {formatInstant(debrief.submittedAt)}
            {sortie.closedAt ? (
              <>
                . Closed by {sortie.closedByName}, {formatInstant(sortie.closedAt)}
                {sortie.closedWhy ? `: ${sortie.closedWhy}` : ""}
              </>
            ) : null}
          </>
        }
        actions={may.close && results.open.length === 0 ? <CloseSortie sortieId={id} number={sortie.number} /> : undefined}
      />
      <Follows results={results} programme={programme} />
      {checks.map(({ card, report, coreVersion, why, createdAt }) => (
        <Section
          key={card.revisionId}
          id={`card-${card.revisionId}`}
          title={`Card ${card.number} rev ${card.letter}, ${card.document.content.title}`}
          aside={`Check ${results.version}, ${why}, ${formatInstant(createdAt)}, core ${coreVersion}`}
        >
          {report.findings.length > 0 ? (
            <ul className="mb-6 border border-rule px-4">
              {report.findings.map((finding) => (
                <li key={finding.code + finding.message} className="border-rule border-b py-2 last:border-b-0">
                  {finding.message}
                </li>
              ))}
            </ul>
          ) : null}
          <p className="mb-4 text-ink-soft text-sm">
            Hot-day basis {report.basis ?? "not set"}. U is expanded, k = 2. Hot-day values are calculated, not flown. Compared unrounded.
          </p>
          <CardResults document={card.document} report={report} debrief={debrief.content} />
        </Section>
      ))}
      {may.dispose || results.dispositions.length > 0 ? (
        <Section
          id="dispositions"
          title="What each point is worth"
          lead="Accept, repeat or void: the engineer’s word, beside the data and never over it."
        >
          <Dispositions
            sortieId={id}
            may={may.dispose}
            points={checks.flatMap(({ card }) =>
              card.document.content.points.map((point, index) => {
                const said = results.dispositions.find(({ pointId }) => pointId === point.id);
                return {
                  revisionId: card.revisionId,
                  id: point.id,
                  name: `Card ${card.number}, ${index + 1} ${point.title}`,
                  disposition: said?.disposition ?? null,
                  why: said?.why ?? "",
                  by: said?.decidedByName ?? null,
                };
              }),
            )}
          />
        </Section>
      ) : null}
      <StepSection results={results} programmeId={programme} roles={actor.roles} />
      {may.close && results.open.length > 0 ? (
        <Section id="closing" title="Before it can be closed">
          <ul className="list-disc ps-5">
            {results.open.map((line) => (
              <li key={line} className="py-1">
                {line}
              </li>
            ))}
          </ul>
        </Section>
      ) : null}
      <Section id="raw" title="As it was typed" lead="The pilot’s raw readings, locked when they were sent.">
        <RawDebrief debrief={debrief.content} documents={checks.map(({ card }) => card.document)} />
      </Section>
      {versions.length > 1 ? (
        <nav aria-label="Earlier checks" className="mb-6 flex flex-wrap gap-4">
          {versions.map((one) => (
            <Link
              key={one}
              aria-current={one === results.version ? "page" : undefined}
              className="min-h-11 underline underline-offset-4 aria-[current]:font-bold aria-[current]:no-underline"
              href={`?version=${one}`}
            >
              Check {one}
            </Link>
          ))}
        </nav>
      ) : null}
      <p className="border-rule border-t pt-4 text-ink-soft text-sm">{SHEET_CAUTION}</p>
    </BinderPage>
  );
}

function Follows({ results: { checks, squawks }, programme }: { results: SortieResults; programme: string }) {
  return (
    <Section id="follows" title="What follows">
      <ul className="flex flex-col gap-3">
        {checks.map(({ card, report }) => (
          <li key={card.revisionId}>
            <span className="font-bold">
              Card {card.number}: {report.decision}.
            </span>{" "}
            {asSentences(report.because)}
            {report.decision === "hold" ? "" : " Proposed; it stands when a reviewer countersigns."}
          </li>
        ))}
        {squawks.map((squawk) => (
          <li key={squawk.id}>
            <Badge tone={squawk.severity === "grounding" ? "red" : squawk.severity === "before next test" ? "yellow" : "plain"}>
              {squawk.severity}
            </Badge>{" "}
            <Link className="underline underline-offset-4" href={`/programmes/${programme}/squawks/${squawk.id}`}>
              Squawk {squawk.number}
            </Link>
            : {squawk.text}
          </li>
        ))}
      </ul>
      {squawks.length === 0 ? <p className="mt-3">No squawk was raised.</p> : null}
    </Section>
  );
}
