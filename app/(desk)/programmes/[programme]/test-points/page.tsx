import type { Metadata } from "next";
import Link from "next/link";
import { Badge } from "@/components/ui/badge";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatMinutes } from "@/lib/format/time";
import { countOf } from "@/lib/format/words";
import type { Hazard } from "@/lib/testcards/card";
import { listHazards, listTestPoints, type TestPoint } from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../../or-not-found";
import { BinderPage } from "../binder-page";
import { highestRisk, RISK_TONE } from "./risk-of-point";

export const metadata: Metadata = { title: "Test points" };

export default async function TestPointsPage({ params }: { params: Promise<{ programme: string }> }) {
  const [{ db, actor }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const points = orNotFound(() => listTestPoints(db, actor, id));
  const hazards = listHazards(db, actor, id);
  const ground = points.filter(({ content }) => content.place === "ground");
  const air = points.filter(({ content }) => content.place === "air");
  return (
    <BinderPage>
      <PageHeader title="Test points" lead={`On the shelf, ${points.length}. A card takes a copy; the shelf stays as it is.`} />
      {points.length === 0 ? <EmptyState title="The shelf is empty">Test points stand here, ready to be put on a card.</EmptyState> : null}
      {ground.length > 0 ? <Shelf id="ground" title="On the ground" points={ground} hazards={hazards} programmeId={id} /> : null}
      {air.length > 0 ? <Shelf id="air" title="In the air" points={air} hazards={hazards} programmeId={id} /> : null}
    </BinderPage>
  );
}

function Shelf({
  id,
  title,
  points,
  hazards,
  programmeId,
}: {
  id: string;
  title: string;
  points: TestPoint[];
  hazards: Hazard[];
  programmeId: string;
}) {
  return (
    <Section id={id} title={title} aside={countOf(points.length, "test point")}>
      <Table label={`Test points, ${title.toLowerCase()}`}>
        <TableHead>
          <HeadCell>Test point</HeadCell>
          <HeadCell className="max-hand:hidden">Order</HeadCell>
          <HeadCell className="max-hand:hidden">Positions</HeadCell>
          <HeadCell className="max-hand:hidden">After</HeadCell>
          <HeadCell className="max-hand:hidden">Complete when</HeadCell>
          <HeadCell figures className="max-hand:hidden">
            Takes
          </HeadCell>
          <HeadCell figures className="max-hand:hidden">
            Readings
          </HeadCell>
          <HeadCell className="max-hand:hidden">Risk</HeadCell>
        </TableHead>
        <tbody>
          {points.map((point) => (
            <ShelfRow key={point.code} point={point} hazards={hazards} programmeId={programmeId} />
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

/** On a phone the columns stand as one line of words under the purpose. */
function ShelfRow({ point: { code, title, content }, hazards, programmeId }: { point: TestPoint; hazards: Hazard[]; programmeId: string }) {
  const risk = highestRisk(content, hazards);
  const positions = content.positions.map(({ control, position }) => `${control} ${position}`).join(", ");
  const riskMark = risk ? <Badge tone={RISK_TONE[risk]}>{risk}</Badge> : "—";
  return (
    <Row>
      <RowHead className="hand:min-w-64">
        <Link href={`/programmes/${programmeId}/test-points/${code}`} className="link py-1 font-bold">
          {code} {title}
        </Link>
        <span className="block text-ink-soft text-sm">{content.purpose}</span>
        <span className="block pt-1 hand:hidden">
          {[
            content.order,
            positions,
            content.parents.length > 0 ? `after ${content.parents.join(", ")}` : "",
            content.completion.rule === "none" ? "" : `complete: ${content.completion.rule}`,
            `takes ${formatMinutes(content.durationMin)}`,
            countOf(content.readings.length, "reading"),
          ]
            .filter(Boolean)
            .join("; ")}
        </span>
        {risk ? <span className="block pt-1 hand:hidden">Risk {riskMark}</span> : null}
      </RowHead>
      <Cell className="max-hand:hidden">{content.order}</Cell>
      <Cell className="whitespace-nowrap max-hand:hidden">{positions || "—"}</Cell>
      <Cell className="max-hand:hidden">{content.parents.join(", ") || "—"}</Cell>
      <Cell className="whitespace-nowrap max-hand:hidden">{content.completion.rule}</Cell>
      <Cell figures className="max-hand:hidden">
        {formatMinutes(content.durationMin)}
      </Cell>
      <Cell figures className="max-hand:hidden">
        {content.readings.length}
      </Cell>
      <Cell className="max-hand:hidden">{riskMark}</Cell>
    </Row>
  );
}
