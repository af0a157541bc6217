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
          <HeadCell>Order</HeadCell>
          <HeadCell>Positions</HeadCell>
          <HeadCell>After</HeadCell>
          <HeadCell>Complete when</HeadCell>
          <HeadCell figures>Takes</HeadCell>
          <HeadCell figures>Readings</HeadCell>
          <HeadCell>Risk</HeadCell>
        </TableHead>
        <tbody>
          {points.map(({ code, title: name, content }) => {
            const risk = highestRisk(content, hazards);
            return (
              <Row key={code}>
                <RowHead className="min-w-64">
                  <Link href={`/programmes/${programmeId}/test-points/${code}`} className="link py-1 font-bold">
                    {code} {name}
                  </Link>
                  <span className="block text-ink-soft text-sm">{content.purpose}</span>
                </RowHead>
                <Cell>{content.order}</Cell>
                <Cell className="whitespace-nowrap">
                  {content.positions.map(({ control, position }) => `${control} ${position}`).join(", ") || "—"}
                </Cell>
                <Cell>{content.parents.join(", ") || "—"}</Cell>
                <Cell className="whitespace-nowrap">{content.completion.rule}</Cell>
                <Cell figures>{formatMinutes(content.durationMin)}</Cell>
                <Cell figures>{content.readings.length}</Cell>
                <Cell>{risk ? <Badge tone={RISK_TONE[risk]}>{risk}</Badge> : "—"}</Cell>
              </Row>
            );
          })}
        </tbody>
      </Table>
    </Section>
  );
}
