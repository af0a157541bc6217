import { formatDerived, formatNumber, ownDecimals } from "@/lib/format/number";
import { formatOnGauge, withUnit } from "@/lib/format/unit";
import type { Instrument, Parameter } from "@/lib/testcards/card";
import type { CheckLine } from "@/lib/testcards/debrief-types";
import { convert } from "@/lib/testcards/units";
import type { Strip } from "./strip-layout";

/** The strip of one judged reading: its limits and its three marks, all in the limit's unit. */
export function stripOf(
  lines: CheckLine[],
  main: CheckLine,
  parameter: Parameter | undefined,
  instrument: Instrument | undefined,
): Strip | null {
  const { limit, asTrue, onGauge, hotDay } = main;
  if (!limit || !onGauge) return null;
  const unit = limit.unit;
  const same = lines.filter((line) => line.limit?.unit === unit);
  const limits = ["placard", "card"] as const;
  return {
    normal: parameter?.normal && parameter.unit === unit ? { low: parameter.normal.low, high: parameter.normal.high } : null,
    limits: limits.flatMap((layer) => {
      const line = same.find(({ comparison, limit: one }) => comparison === `as flown, ${layer}` && one?.side === limit.side);
      return line?.limit
        ? [{ layer, side: line.limit.side, value: line.limit.value, label: formatNumber(line.limit.value, ownDecimals(line.limit.value)) }]
        : [];
    }),
    marks: [
      {
        kind: "reading" as const,
        value: convert(onGauge.value, onGauge.unit, unit),
        label: instrument ? formatOnGauge(onGauge.value, instrument) : withUnit(formatNumber(onGauge.value, 1), onGauge.unit),
      },
      ...(asTrue
        ? [
            {
              kind: "true" as const,
              value: asTrue.value,
              expandedUncertainty: asTrue.expandedUncertainty,
              label: `${formatDerived(asTrue.value)} true`,
            },
          ]
        : []),
      ...(hotDay
        ? [
            {
              kind: "hot day" as const,
              value: hotDay.value,
              expandedUncertainty: hotDay.expandedUncertainty,
              label: `${formatDerived(hotDay.value)} hot day`,
            },
          ]
        : []),
    ],
  };
}
