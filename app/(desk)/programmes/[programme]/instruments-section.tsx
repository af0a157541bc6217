import { Badge } from "@/components/ui/badge";
import { Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatNumber, formatUncertainty, ownDecimals } from "@/lib/format/number";
import { daysBetween, formatDay } from "@/lib/format/time";
import { formatQuantity, unitLabel, withUnit } from "@/lib/format/unit";
import { listAnd } from "@/lib/format/words";
import type { CalibrationRecord, Instrument, Parameter } from "@/lib/testcards/card";

const figure = (value: number) => formatNumber(value, ownDecimals(value));
const SOON_DAYS = 30;

export function InstrumentsSection({
  instruments,
  parameters,
  today,
}: {
  instruments: Instrument[];
  parameters: Parameter[];
  today: string;
}) {
  return (
    <Section
      id="instruments"
      title="Instruments and calibrations"
      lead="A gauge is believed for what was proved of it, over the range in which it was proved, until the day it stands for. Outside that there is no verdict."
    >
      <Table label="Instruments and calibrations">
        <TableHead>
          <HeadCell>Instrument</HeadCell>
          <HeadCell figures>Range</HeadCell>
          <HeadCell figures>U (k = 2)</HeadCell>
          <HeadCell>Indicated to true</HeadCell>
          <HeadCell>Calibration</HeadCell>
        </TableHead>
        <tbody>
          {instruments.map((instrument) => (
            <Row key={instrument.id}>
              <RowHead className="min-w-52">
                <span className="font-bold">{instrument.name}</span>{" "}
                {parameters.find(({ code }) => code === instrument.parameter)?.name ?? instrument.parameter}
                <span className="block text-ink-soft text-sm">
                  “{instrument.gaugeName}”, {instrument.shownOn}, seen by {listAnd(instrument.visibleTo) || "nobody in flight"}
                </span>
              </RowHead>
              <Cell figures>
                {withUnit(`${figure(instrument.low)} to ${figure(instrument.high)}`, instrument.unit)}
                <span className="block text-ink-soft text-sm">
                  readable to {formatQuantity({ value: instrument.readable, unit: instrument.unit })}
                </span>
              </Cell>
              <Cell figures>{instrument.calibration ? uncertaintyWords(instrument.calibration) : "—"}</Cell>
              <Cell className="min-w-52">{instrument.calibration ? <CalibrationTable calibration={instrument.calibration} /> : "—"}</Cell>
              <Cell className="min-w-60">
                <CalibrationState calibration={instrument.calibration} today={today} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

function uncertaintyWords({ expandedUncertainty: U, unit }: CalibrationRecord): string {
  return withUnit(formatUncertainty(U, ownDecimals(U ?? 0)), unit);
}

function CalibrationState({ calibration, today }: { calibration: CalibrationRecord | null; today: string }) {
  if (!calibration) return <Badge tone="red">not calibrated</Badge>;
  const left = daysBetween(today, calibration.validUntil);
  const moved = calibration.disturbedOn !== null && calibration.disturbedOn >= calibration.calibratedOn;
  return (
    <>
      {moved ? <Badge tone="red">moved since: calibrate in place</Badge> : null}
      {!moved && left < 0 ? <Badge tone="red">out of calibration</Badge> : null}
      {!moved && left >= 0 ? (
        <Badge tone={left <= SOON_DAYS ? "yellow" : "green"}>{left <= SOON_DAYS ? `ends in ${left} days` : "in calibration"}</Badge>
      ) : null}
      <span className="whitespace-nowrap text-sm">
        {" "}
        {formatDay(calibration.calibratedOn)} until {formatDay(calibration.validUntil)}
      </span>
      <span className="block text-ink-soft text-sm">
        {calibration.method}. {calibration.reference}.
      </span>
    </>
  );
}

function CalibrationTable({ calibration }: { calibration: CalibrationRecord }) {
  const { low, high, unit } = calibration;
  const range = withUnit(`${figure(low)} to ${figure(high)}`, unit);
  if (calibration.kind === "linear")
    return (
      <>
        true = {figure(calibration.gain)} × indicated {calibration.offset < 0 ? "−" : "+"} {figure(Math.abs(calibration.offset))}
        <span className="block text-ink-soft text-sm">proved {range}</span>
      </>
    );
  if (calibration.points.every(({ read, actual }) => read === actual))
    return (
      <>
        reads true at {listAnd(calibration.points.map(({ read }) => figure(read)))} {unitLabel(unit)}
        <span className="block text-ink-soft text-sm">proved {range}</span>
      </>
    );
  return (
    <>
      <span className="flex flex-wrap gap-x-3">
        {calibration.points.map(({ read, actual }) => (
          <span key={read} className="whitespace-nowrap">
            {figure(read)} to <strong>{figure(actual)}</strong>
          </span>
        ))}
      </span>
      <span className="block text-ink-soft text-sm">proved {range}</span>
    </>
  );
}
