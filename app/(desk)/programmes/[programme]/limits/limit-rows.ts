import { formatNumber, ownDecimals } from "@/lib/format/number";
import { formatOnGauge, formatQuantity, withUnit } from "@/lib/format/unit";
import { correctReading } from "@/lib/testcards/calibration";
import type { AbortNumber, Instrument, Limit, Parameter } from "@/lib/testcards/card";
import { bandOnGauge, differenceOnGauge, onGauge } from "@/lib/testcards/sheet-layout/gauge-figures";
import { convert, rateUnitOf, sameDimension } from "@/lib/testcards/units";

export type LimitRow = {
  key: string;
  layer: "normal" | "placard" | "card" | "abort";
  words: string;
  trueText: string;
  onGauges: string[];
  source: string;
};

const figure = (value: number) => formatNumber(value, ownDecimals(value));

/** What prints, or why nothing may: a gauge says nothing outside the range in which it was proved. */
function gaugeText(limit: Limit, instrument: Instrument): string {
  if (!sameDimension(limit.unit, instrument.unit)) {
    const change = differenceOnGauge(limit.value, limit.unit, limit.side, instrument);
    return typeof change === "string" ? change : withUnit(figure(change), rateUnitOf(instrument.unit) ?? instrument.unit);
  }
  const shown = onGauge(limit.value, limit.unit, limit.side, instrument);
  return typeof shown === "string" ? shown : formatOnGauge(shown, instrument);
}

export function normalRow(parameter: Parameter, instruments: Instrument[]): LimitRow[] {
  const { normal } = parameter;
  if (!normal) return [];
  const ends = (low: number | null, high: number | null) => [low, high].map((end) => (end === null ? "…" : figure(end))).join(" to ");
  return [
    {
      key: "normal",
      layer: "normal",
      words: "normal range",
      trueText: withUnit(ends(normal.low, normal.high), normal.unit),
      onGauges: instruments.map((instrument) => {
        const band = bandOnGauge(normal, instrument);
        return typeof band === "string" ? band : withUnit(ends(band.low, band.high), instrument.unit);
      }),
      source: "",
    },
  ];
}

const sideWords = { max: "at most", min: "at least" } as const;

function whenWords({ appliesWhen, forS, statistic }: Pick<Limit, "appliesWhen" | "forS" | "statistic">): string {
  return [
    statistic === "instant" ? "" : statistic,
    appliesWhen,
    forS > 0 ? `may be passed for ${forS >= 60 ? `${figure(forS / 60)} min` : `${figure(forS)} s`}` : "",
  ]
    .filter(Boolean)
    .join(", ");
}

export function limitRow(limit: Limit, instruments: Instrument[]): LimitRow {
  return {
    key: limit.id,
    layer: limit.layer,
    words: `${limit.layer}, ${sideWords[limit.side]}, ${whenWords(limit)}`,
    trueText: formatQuantity({ value: limit.value, unit: limit.unit }),
    onGauges: instruments.map((instrument) => gaugeText(limit, instrument)),
    source: limit.source,
  };
}

/** A standing abort beside the limits it keeps; the true value is that of the number printed. */
export function abortRow(line: AbortNumber, parameter: Parameter, instruments: Instrument[]): LimitRow {
  const own = instruments.find(({ id }) => id === line.instrument);
  const back = own?.calibration && !line.perMinute ? correctReading(line.onGauge, own.calibration) : null;
  const trueOfPrinted = own && back?.inRange ? convert(back.value, own.unit, parameter.unit) : null;
  const window = line.perMinute && line.windowS !== null ? ` in ${figure(line.windowS)} s` : "";
  return {
    key: line.id,
    layer: "abort",
    words: `abort, ${line.side === "max" ? "at" : "below"}, ${line.perMinute ? "rate, " : ""}${line.appliesWhen}`,
    trueText: trueOfPrinted === null ? "—" : withUnit(formatNumber(trueOfPrinted, 1), parameter.unit),
    onGauges: instruments.map((instrument) =>
      instrument.id === line.instrument ? `${formatOnGauge(line.onGauge, instrument)}${window}` : "—",
    ),
    source: `standing, called by the ${line.calledBy}`,
  };
}
