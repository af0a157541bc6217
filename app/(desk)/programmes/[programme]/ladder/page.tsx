import type { Metadata } from "next";
import Link from "next/link";
import { Badge, type BadgeTone } from "@/components/ui/badge";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay } from "@/lib/format/time";
import type { StepDecision } from "@/lib/testcards/words";
import {
  listInstruments,
  listParameters,
  listStepDecisions,
  listTestPoints,
  type StepDecisionRow,
  type TestPoint,
} from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../../or-not-found";
import { BinderPage } from "../binder-page";
import { LadderDrawing } from "./ladder-drawing";
import { seriesRungs } from "./series-ladder";

export const metadata: Metadata = { title: "Ladder" };

const TONE: Record<StepDecision, BadgeTone> = { "clear to next step": "green", "smaller step": "yellow", hold: "red" };

export default async function LadderPage({ params }: { params: Promise<{ programme: string }> }) {
  const [{ db, actor }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const points = orNotFound(() => listTestPoints(db, actor, id));
  const decisions = listStepDecisions(db, actor, id);
  const instruments = listInstruments(db, actor, id);
  const parameters = listParameters(db, actor, id);
  const series = points.filter(({ content }) => content.series?.base);
  return (
    <BinderPage>
      <p className="pb-3">
        <Link href={`/programmes/${id}`} className="link inline-block py-2">
          Programme
        </Link>
      </p>
      <PageHeader
        title="Ladder"
        lead="From the ground up, one change at a time. A step stands when an engineer has proposed it and a reviewer countersigned; a hold may be given by anyone."
      />
      {series.map(({ code, title, content }) => (
        <Section key={code} id={code} title={content.series?.name ?? title} aside={`${code} ${title}`}>
          <LadderDrawing
            label={`Steps of ${content.series?.name ?? title}`}
            rungs={seriesRungs(
              content,
              decisions.filter((row) => row.testPointCode === code),
              instruments,
              parameters,
            )}
          />
        </Section>
      ))}
      <Section id="points" title="Every test point, in build-up order">
        {points.length === 0 ? (
          <EmptyState title="No test points yet">Steps appear here once the shelf holds test points.</EmptyState>
        ) : (
          <Steps points={points} decisions={decisions} programmeId={id} />
        )}
      </Section>
    </BinderPage>
  );
}

function Steps({ points, decisions, programmeId }: { points: TestPoint[]; decisions: StepDecisionRow[]; programmeId: string }) {
  const ordered = [...points].sort((a, b) => stepOrder(a) - stepOrder(b));
  return (
    <Table label="Every test point and the last decision on it">
      <TableHead>
        <HeadCell>Order</HeadCell>
        <HeadCell>Test point</HeadCell>
        <HeadCell>After</HeadCell>
        <HeadCell>Last decision</HeadCell>
        <HeadCell>Because</HeadCell>
      </TableHead>
      <tbody>
        {ordered.map(({ code, title, content }) => {
          const last = decisions.findLast((row) => row.testPointCode === code);
          return (
            <Row key={code}>
              <Cell>{content.order}</Cell>
              <RowHead className="min-w-52">
                <Link href={`/programmes/${programmeId}/test-points/${code}`} className="link py-1 font-bold">
                  {code} {title}
                </Link>
              </RowHead>
              <Cell>{content.parents.join(", ") || "—"}</Cell>
              <Cell className="min-w-48">{last ? <Decision row={last} /> : <span className="text-ink-soft">not flown</span>}</Cell>
              <Cell className="min-w-60">{last ? last.because.join("; ") || "—" : "—"}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

function Decision({ row }: { row: StepDecisionRow }) {
  return (
    <>
      <Badge tone={TONE[row.decision]}>{row.decision}</Badge>
      <span className="block text-ink-soft text-sm">
        {row.step}, {row.origin === "paper records" ? "from paper records" : formatDay(row.createdAt)}
        {row.countersignedAt || row.decision === "hold" || row.origin === "paper records"
          ? ""
          : ", waits for a reviewer's countersignature"}
      </span>
    </>
  );
}

/** Ground before flight, lower first: "G2" stands below "F1". */
function stepOrder({ content: { order } }: TestPoint): number {
  const number = Number.parseInt(order.replace(/\D+/g, ""), 10) || 0;
  return (order.startsWith("G") ? 0 : 1000) + number;
}
