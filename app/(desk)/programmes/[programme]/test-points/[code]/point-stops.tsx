import { Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatNumber } from "@/lib/format/number";
import { formatQuantity, withUnit } from "@/lib/format/unit";
import { abortsOf, type CardPoint, type ProgrammeSnapshot } from "@/lib/testcards/card";
import { abortWords } from "../../rules-section";

/** What must not be passed in this point, and when to stop: the programme's table, the point's own limits, the aborts in force. */
export function PointStops({ point, programme }: { point: CardPoint; programme: ProgrammeSnapshot }) {
  const own = new Set(point.aborts.lines.map(({ id }) => id));
  const aborts = abortsOf(programme, point).sort((a, b) => Number(own.has(b.id)) - Number(own.has(a.id)));
  return (
    <Section
      id="stops"
      title="Limits and aborts"
      aside={
        point.cardTable
          ? `judged against every programme limit that applies ${point.conditions.join(", ") || "always"}`
          : "the programme's limits are not asked of it"
      }
    >
      {point.limits.length > 0 ? (
        <Table label="Limits of this point alone">
          <TableHead>
            <HeadCell>Its own limit</HeadCell>
            <HeadCell figures>True</HeadCell>
            <HeadCell figures>U</HeadCell>
            <HeadCell>Source</HeadCell>
          </TableHead>
          <tbody>
            {point.limits.map((limit) => (
              <Row key={limit.id}>
                <RowHead>
                  {limit.label} <span className="text-ink-soft">{limit.statistic === "instant" ? "" : limit.statistic}</span>
                </RowHead>
                <Cell figures>
                  {formatQuantity(limit)} {limit.side === "max" ? "or less" : "or more"}
                </Cell>
                <Cell figures>
                  {limit.expandedUncertainty === null
                    ? "the gauge's"
                    : withUnit(`±${formatNumber(limit.expandedUncertainty, 2)}`, limit.unit)}
                </Cell>
                <Cell>{limit.source}</Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      ) : null}
      <h3 className="pt-5 pb-1 font-bold">Abort, on the gauge, if any</h3>
      <ul className="grid gap-x-8 hand:grid-cols-2">
        {aborts.map((line) => (
          <li key={line.id} className="flex justify-between gap-4 border-rule border-b py-2">
            <span className="font-bold">{abortWords(line, programme.instruments)}</span>
            <span className="text-ink-soft text-sm">{own.has(line.id) ? "its own" : "standing"}</span>
          </li>
        ))}
      </ul>
    </Section>
  );
}
