import { type AbortLine, type AbortNumber, abortsOf, type CardDocument, type CardPoint, instrumentOf, parameterOf } from "../card";
import { figure, isCalibrated, withUnit } from "./gauge-figures";
import type { ListLine } from "./limit-lines";

export type AbortList = { ifReached: boolean; lines: ListLine[]; events: string[] };

function inForce(point: CardPoint, line: AbortLine): boolean {
  return (
    line.kind === "event" || ["always", "at power", "full power"].includes(line.appliesWhen) || point.conditions.includes(line.appliesWhen)
  );
}

function numberLine(card: CardDocument, line: AbortNumber): ListLine {
  const instrument = instrumentOf(card, line.instrument);
  const gauge = instrument?.gaugeName ?? line.instrument;
  const name = line.perMinute ? (parameterOf(card, line.parameter)?.shortName ?? gauge) : gauge;
  if (instrument && !isCalibrated(instrument) && line.setBy !== "gauge") return { name, value: "not calibrated" };
  const number = withUnit(figure(line.onGauge, instrument?.unit ?? null), instrument?.unit ?? null);
  const moment = ["idle", "take-off", "cold start"].includes(line.appliesWhen) ? `, ${line.appliesWhen}` : "";
  const window = line.perMinute ? ` in ${line.windowS ?? 60}\u00a0s` : "";
  const caller = line.calledBy === "observer" ? ", observer" : "";
  return { name, value: `${line.side === "min" ? "below " : ""}${number}${window}${moment}${caller}` };
}

/** A point's abort list as it prints: numbers in the order of the parameters, then events. */
export function abortList(card: CardDocument, point: CardPoint): AbortList {
  const lines = abortsOf(card.programme, point).filter((line) => inForce(point, line));
  const order = card.programme.parameters.map((p) => p.code);
  const numbers = lines.flatMap((line) => (line.kind === "number" ? [line] : []));
  numbers.sort((a, b) => order.indexOf(a.parameter) - order.indexOf(b.parameter));
  return {
    ifReached: point.aborts.ifReached,
    lines: numbers.map((line) => numberLine(card, line)),
    events: lines.flatMap((line) => (line.kind === "event" ? [line.text] : [])),
  };
}

/** Points with the same key may share a page, for a page carries one abort list and one THEN line. */
export function pageKey(point: CardPoint, aborts: AbortList): string {
  return JSON.stringify([point.place, aborts]);
}
