import { ArcStrip } from "@/components/gauge/arc-strip";
import type { Strip } from "@/components/gauge/strip-layout";
import { Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatNumber, formatUncertainty, ownDecimals } from "@/lib/format/number";
import { withUnit } from "@/lib/format/unit";
import { sentenceCase } from "@/lib/format/words";
import { correctReading } from "@/lib/testcards/calibration";
import type { AbortLine, AbortNumber, Instrument, Limit, Parameter } from "@/lib/testcards/card";
import { convert, sameDimension } from "@/lib/testcards/units";
import { abortRow, type LimitRow, limitRow, normalRow } from "./limit-rows";

const DRAWN_WHEN = new Set<Limit["appliesWhen"]>(["always", "at power", "full power"]);
const figure = (value: number) => formatNumber(value, ownDecimals(value));

export function ParameterLimits({
  parameter,
  limits,
  instruments,
  standingAborts,
}: {
  parameter: Parameter;
  limits: Limit[];
  instruments: Instrument[];
  standingAborts: AbortLine[];
}) {
  const aborts = standingAborts.filter((line): line is AbortNumber => line.kind === "number" && line.parameter === parameter.code);
  const rows = [
    ...normalRow(parameter, instruments),
    ...limits.map((limit) => limitRow(limit, instruments)),
    ...aborts.map((line) => abortRow(line, parameter, instruments)),
  ];
  return (
    <Section id={parameter.code} title={parameter.name} aside={`hot-day rule: ${parameter.hotDayRule}`}>
      <ArcStrip
        title={`${parameter.name}, true`}
        strip={stripOf(parameter, limits, aborts, instruments)}
        className="max-w-[22rem] pb-2 desk:max-w-[27rem]"
      />
      <Table label={`Limits of ${parameter.name}`}>
        <TableHead>
          <HeadCell>Layer</HeadCell>
          <HeadCell className="hand:hidden">True, on the gauge</HeadCell>
          <HeadCell figures className="max-hand:hidden">
            True
          </HeadCell>
          {instruments.map((instrument) => (
            <HeadCell key={instrument.id} figures className="min-w-56 max-hand:hidden">
              On the gauge
              <span className="block font-normal">
                {instrument.name}
                {instrument.calibration
                  ? `, U ${withUnit(formatUncertainty(instrument.calibration.expandedUncertainty, ownDecimals(instrument.calibration.expandedUncertainty ?? 0)), instrument.unit)}`
                  : ", not calibrated"}
              </span>
            </HeadCell>
          ))}
          <HeadCell className="max-hand:hidden">Source</HeadCell>
        </TableHead>
        <tbody>
          {rows.map((row) => (
            <LimitLine key={row.key} row={row} gauges={instruments} />
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

/** On a phone the true value and what each gauge shows stand under one another in one cell, the source under the words. */
function LimitLine({ row: { layer, words, trueText, onGauges, source }, gauges }: { row: LimitRow; gauges: Instrument[] }) {
  const [head = "", ...rest] = words.split(", ");
  return (
    <Row>
      <RowHead className="hand:min-w-56">
        <span className={layer === "normal" ? "" : "font-bold"}>{sentenceCase(head)}</span>
        {rest.length > 0 ? <span className="text-ink-soft">, {rest.join(", ")}</span> : null}
        {source ? <span className="block text-ink-soft text-sm hand:hidden">{source}</span> : null}
      </RowHead>
      <Cell className="hand:hidden">
        <StackedFigure label="true" text={trueText} />
        {gauges.map(({ id, name }, i) => (
          <StackedFigure key={id} label={`on the gauge, ${name}`} text={onGauges[i] ?? "—"} bold={layer === "abort"} />
        ))}
      </Cell>
      <Cell figures className="max-hand:hidden">
        {trueText}
      </Cell>
      {gauges.map(({ id }, i) => (
        <Cell key={id} figures className={layer === "abort" ? "font-bold max-hand:hidden" : "max-hand:hidden"}>
          {onGauges[i] ?? "—"}
        </Cell>
      ))}
      <Cell className="min-w-40 text-ink-soft max-hand:hidden">{source}</Cell>
    </Row>
  );
}

function StackedFigure({ label, text, bold = false }: { label: string; text: string; bold?: boolean }) {
  return (
    <span className="block pb-1">
      <span className="block text-ink-soft text-sm">{label}</span>
      <span className={bold ? "font-bold" : ""}>{text}</span>
    </span>
  );
}

/** The layers that hold in running, on the parameter's own scale; moments of their own stand in the table only. */
function stripOf(parameter: Parameter, limits: Limit[], aborts: AbortNumber[], instruments: Instrument[]): Strip {
  const drawn = limits.filter(
    (limit) => sameDimension(limit.unit, parameter.unit) && limit.forS === 0 && DRAWN_WHEN.has(limit.appliesWhen),
  );
  return {
    normal: parameter.normal,
    limits: [
      ...drawn.map(({ layer, side, value, unit }) => {
        const at = convert(value, unit, parameter.unit);
        return { layer, side, value: at, label: layer === "placard" ? withUnit(figure(at), parameter.unit) : figure(at) };
      }),
      ...aborts.flatMap((line) => {
        const instrument = instruments.find(({ id }) => id === line.instrument);
        if (!instrument?.calibration || line.perMinute || line.appliesWhen === "idle") return [];
        const at = convert(correctReading(line.onGauge, instrument.calibration).value, instrument.unit, parameter.unit);
        return [{ layer: "abort" as const, side: line.side, value: at, label: formatNumber(at, 1) }];
      }),
    ],
    marks: [],
  };
}
