import { VerdictMark } from "@/components/gauge/verdict-mark";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatDerived, formatMargin, formatNumber, formatUncertainty, ownDecimals } from "@/lib/format/number";
import { formatQuantity, unitLabel, withUnit } from "@/lib/format/unit";
import type { CheckLine } from "@/lib/testcards/debrief-types";
import type { ResultRow } from "./result-rows";

/** Every reading of a point: on the gauge, true, as flown, hot day, what is in hand and to which limit. */
export function ResultsTable({ label, rows }: { label: string; rows: ResultRow[] }) {
  return (
    <>
      <div className="hidden hand:block">
        <Table label={label}>
          <TableHead>
            <HeadCell className="min-w-48">Reading</HeadCell>
            <HeadCell figures>On the gauge</HeadCell>
            <HeadCell figures>True ±U</HeadCell>
            <HeadCell>As flown, to card</HeadCell>
            <HeadCell>As flown, to placard</HeadCell>
            <HeadCell figures>Hot day ±U</HeadCell>
            <HeadCell>Hot day, to placard</HeadCell>
          </TableHead>
          <tbody>
            {rows.map((row) => (
              <Row key={row.key}>
                <RowHead>
                  {row.label}
                  <span className="block text-ink-soft text-sm">{limitWords(row)}</span>
                </RowHead>
                <Cell figures>{onGauge(row.main)}</Cell>
                <Cell figures>{asTrue(row.main)}</Cell>
                <Cell>
                  <Judged line={row.card} />
                </Cell>
                <Cell>
                  <Judged line={row.placard} />
                </Cell>
                <Cell figures>{hotDay(row.hotDay)}</Cell>
                <Cell>
                  <Judged line={row.hotDay} />
                </Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      </div>
      <ul className="hand:hidden">
        {rows.map((row) => (
          <li key={row.key} className="border-rule border-b py-4">
            <p className="font-bold">{row.label}</p>
            <p className="text-ink-soft">{limitWords(row)}</p>
            <dl className="mt-2 grid grid-cols-[auto_1fr] items-baseline gap-x-4 gap-y-2">
              <Pair term="On the gauge">{onGauge(row.main)}</Pair>
              <Pair term="True">{asTrue(row.main)}</Pair>
              {row.card ? (
                <Pair term="As flown, card">
                  <Judged line={row.card} />
                </Pair>
              ) : null}
              {row.placard ? (
                <Pair term="As flown, placard">
                  <Judged line={row.placard} />
                </Pair>
              ) : null}
              {row.hotDay ? (
                <>
                  <Pair term="Hot day">{hotDay(row.hotDay)}</Pair>
                  <Pair term="Hot day, placard">
                    <Judged line={row.hotDay} />
                  </Pair>
                </>
              ) : null}
            </dl>
          </li>
        ))}
      </ul>
    </>
  );
}

function Pair({ term, children }: { term: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="text-ink-soft">{term}</dt>
      <dd className="text-end tabular-nums">{children}</dd>
    </>
  );
}

const NONE = <span className="text-ink-soft">—</span>;

/** Verdict, what is in hand, and every reason and note; a withheld one never stands without its reason. */
export function Judged({ line }: { line: CheckLine | null }) {
  if (!line) return NONE;
  const { verdict, margin, limit, reasons, notes, informationOnly, required, why, otherBasis } = line;
  const rest = notes.filter((note) => !(reasons as string[]).includes(note));
  const further = reasons.slice(verdict === "no verdict" ? 1 : 0);
  return (
    <span className="inline-flex flex-col items-end gap-0.5 hand:items-start">
      <VerdictMark verdict={verdict} reason={verdict === "no verdict" ? (reasons[0] ?? null) : null} />
      {margin !== null && limit ? (
        <span className="whitespace-nowrap text-sm tabular-nums">
          {informationOnly ? "information only: " : ""}
          {margin < 0 ? `${withUnit(formatMargin(-margin), limit.unit)} past` : `${withUnit(formatMargin(margin), limit.unit)} in hand`}
        </span>
      ) : null}
      {rest.length + further.length > 0 ? <span className="text-ink-soft text-sm">{[...rest, ...further].join(", ")}</span> : null}
      {why ? <span className="text-ink-soft text-sm">{why}</span> : null}
      {otherBasis ? (
        <span className="text-sm">
          {otherBasis.basis} basis: {withUnit(formatNumber(otherBasis.hotDay.value, 1), otherBasis.hotDay.unit)}{" "}
          {formatUncertainty(otherBasis.hotDay.expandedUncertainty)}, {otherBasis.verdict}
        </span>
      ) : null}
      {required || line.comparison !== "hot day, placard" ? null : <span className="text-ink-soft text-sm">not required here</span>}
    </span>
  );
}

function limitWords({ side, applies, card, placard, hotDay, unit }: ResultRow): string {
  const values = [
    ["placard", placard ?? hotDay],
    ["card", card],
  ] as const;
  const limits = values.flatMap(([layer, line]) =>
    line?.limit ? [`${layer} ${formatNumber(line.limit.value, ownDecimals(line.limit.value))}`] : [],
  );
  if (limits.length === 0) return "";
  return `${side ?? ""} ${limits.join(", ")} ${unit ? unitLabel(unit) : ""}${applies ? `, ${applies}` : ""}`.trim();
}

function onGauge({ onGauge: value }: CheckLine) {
  return value ? withUnit(formatNumber(value.value, ownDecimals(value.value, 2)), value.unit) : NONE;
}

function asTrue({ asTrue: value }: CheckLine) {
  return value ? (
    <>
      {withUnit(formatDerived(value.value), value.unit)}
      <span className="block text-ink-soft text-sm">{formatUncertainty(value.expandedUncertainty)}</span>
    </>
  ) : (
    NONE
  );
}

function hotDay(line: CheckLine | null) {
  if (!line?.hotDay) return NONE;
  const { value, unit, expandedUncertainty, ambient, hotAmbient, clamped } = line.hotDay;
  return (
    <>
      {withUnit(formatDerived(value), unit)}
      <span className="block text-ink-soft text-sm">
        {formatUncertainty(expandedUncertainty)}
        <br />
        {clamped
          ? "hotter than the hot day: nothing subtracted"
          : `air ${formatNumber(ambient.value, 1)}, hot day ${formatQuantity(hotAmbient, 2)}`}
      </span>
    </>
  );
}
