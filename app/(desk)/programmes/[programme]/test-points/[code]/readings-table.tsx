import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatBand, unitLabel, withUnit } from "@/lib/format/unit";
import type { CardPoint, Instrument, ProgrammeSnapshot, Reading } from "@/lib/testcards/card";
import { bandOnGauge, figure } from "@/lib/testcards/sheet-layout/gauge-figures";

export function ReadingsTable({ point, programme }: { point: CardPoint; programme: ProgrammeSnapshot }) {
  return (
    <Table label="Readings">
      <TableHead>
        <HeadCell>Reading</HeadCell>
        <HeadCell>Kind</HeadCell>
        <HeadCell>On</HeadCell>
        <HeadCell>Taken by</HeadCell>
        <HeadCell figures>Expected, true</HeadCell>
        <HeadCell figures>Expected, on the gauge</HeadCell>
      </TableHead>
      <tbody>
        {point.readings.map((reading) => {
          const instrument = programme.instruments.find(({ id }) => id === reading.instrument);
          return (
            <Row key={reading.id}>
              <RowHead className="min-w-48">
                <span className="font-bold">{reading.label}</span>
                {reading.choices.length > 0 ? <span className="block text-ink-soft text-sm">{reading.choices.join(", ")}</span> : null}
              </RowHead>
              <Cell>
                {reading.kind}
                {reading.kind === "number" ? <span className="text-ink-soft">, {reading.sampling}</span> : null}
              </Cell>
              <Cell className="whitespace-nowrap">
                {instrument ? instrument.name : "—"}
                {reading.unit && unitLabel(reading.unit) ? <span className="text-ink-soft"> {unitLabel(reading.unit)}</span> : null}
              </Cell>
              <Cell className="whitespace-nowrap">
                {reading.recordedBy}
                {reading.onSheet === "none" ? "" : ", on the sheet"}
              </Cell>
              <Cell figures>{reading.expected ? formatBand(reading.expected) : "—"}</Cell>
              <Cell figures>{expectedOnGauge(reading, instrument)}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

function expectedOnGauge(reading: Reading, instrument: Instrument | undefined): string {
  if (!reading.expected || !instrument) return "—";
  const band = bandOnGauge(reading.expected, instrument);
  if (typeof band === "string") return band;
  const ends = [band.low, band.high].filter((end): end is number => end !== null).map((end) => figure(end, instrument.unit));
  return withUnit(ends.join(" to "), instrument.unit);
}
