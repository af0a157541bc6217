/** What follows from the lines: what fell off its prediction, which squawks to raise, and what somebody must look at. */
import { type CardDocument, type CardPoint, parameterOf } from "./card";
import type { Subject } from "./check-as-flown";
import { oneDecimal } from "./check-completion";
import { correct, extremeOf } from "./check-gauge";
import type { CheckContext, CheckLine, Debrief, PointDebrief, PointReport, SuggestedSquawk } from "./debrief-types";
import type { Finding } from "./readiness-types";
import { withUnit } from "./unit-symbols";
import type { Reason, Side } from "./words";

const ROUNDING = 1e-9;

/** A reading outside the band the card printed for it. A highest below the band is off its prediction as well. */
export function outsideExpected(subject: Subject): PointReport["outsideExpected"][number] | null {
  const { reading, entry, gauge } = subject;
  const band = reading.expected;
  if (!band) return null;
  const sides: Side[] = reading.sampling === "lowest and highest" ? ["min", "max"] : [reading.sampling === "lowest" ? "min" : "max"];
  for (const side of sides) {
    const raw = extremeOf(reading, entry, side);
    const corrected = raw && correct(raw.value, gauge, band.unit);
    if (!corrected) continue;
    const { value } = corrected;
    const low = band.low !== null && value < band.low - ROUNDING && !(sides.length === 2 && side === "max");
    const high = band.high !== null && value > band.high + ROUNDING && !(sides.length === 2 && side === "min");
    if (low || high) return { reading: reading.id, asTrue: value, unit: band.unit, low: band.low, high: band.high };
  }
  return null;
}

/** Why a whole point cannot stand for its card: another configuration, or flown otherwise than the card says. */
export function withheldOn(card: CardDocument, point: CardPoint, said: PointDebrief | null, context: CheckContext): Subject["withheld"] {
  const withheld: { reason: Reason; why: string }[] = [];
  const configuration = card.programme.configuration;
  if (configuration && context.configurationId !== null && context.configurationId !== configuration.id)
    withheld.push({ reason: "wrong configuration", why: `the card is for configuration ${configuration.number}` });
  const moved = point.positions.flatMap(({ control, position }) => {
    const flown = said?.positions.find((candidate) => candidate.control === control)?.position;
    return flown && flown !== position ? [`flown ${control} ${flown}, the card says ${position}`] : [];
  });
  for (const why of moved) withheld.push({ reason: "off condition", why });
  if (said?.onCondition === false && moved.length === 0) withheld.push({ reason: "off condition", why: "the pilot was not on condition" });
  return withheld;
}

/** As flown past an engine or aircraft placard grounds; past a programme limit, or marginal against a placard, comes before the next test. */
export function squawksOf(card: CardDocument, lines: readonly CheckLine[], debrief: Debrief): SuggestedSquawk[] {
  const found = new Map<string, SuggestedSquawk>();
  for (const line of lines) {
    if (!line.limit || (line.comparison !== "as flown, card" && line.comparison !== "as flown, placard")) continue;
    const { authority } = line.limit;
    const placard = line.comparison === "as flown, placard";
    const grounds = placard && (authority === "engine" || authority === "aircraft");
    const severity = line.verdict === "exceeded" ? (grounds ? "grounding" : "before next test") : "before next test";
    if (line.verdict !== "exceeded" && !(line.verdict === "marginal" && placard)) continue;
    const known = found.get(`${line.point} ${line.reading}`);
    if (known && (known.severity === "grounding" || severity !== "grounding")) continue;
    found.set(`${line.point} ${line.reading}`, { point: line.point, reading: line.reading, severity, text: squawkText(card, line) });
  }
  for (const point of card.content.points) {
    const called = debrief.safety.calls.find((call) => call.point === point.id && call.word !== "terminate");
    const aborted = called || debrief.points.some((said) => said.point === point.id && said.outcome === "aborted");
    if (!aborted || [...found.values()].some((squawk) => squawk.point === point.id)) continue;
    const trigger = called ? `: ${parameterOf(card, called.trigger)?.name ?? called.trigger}` : "";
    const reading = point.readings.find((candidate) => candidate.parameter === called?.trigger)?.id ?? "";
    found.set(point.id, { point: point.id, reading, severity: "before next test", text: `${point.title}: aborted${trigger}` });
  }
  return [...found.values()];
}

function squawkText(card: CardDocument, { limit, asTrue, verdict, parameter, notes }: CheckLine): string {
  const name = parameterOf(card, parameter)?.name ?? parameter ?? "Reading";
  if (!limit) return name;
  const said = asTrue ? ` ${withUnit(oneDecimal(asTrue.value), limit.unit)} as flown,` : "";
  const against = `${limit.side} ${withUnit(oneDecimal(limit.value), limit.unit)} (${limit.source})`;
  return `${name}:${said} ${verdict} against ${against}${notes.length > 0 ? `, ${notes.join(", ")}` : ""}`;
}

export function findingsOf(
  card: CardDocument,
  debrief: Debrief,
  context: CheckContext,
  lines: readonly CheckLine[],
  reports: readonly PointReport[],
): Finding[] {
  const { id, number, letter } = card.identity;
  const findings: Finding[] = [];
  const flown = debrief.revisionsFlown.find((candidate) => candidate.card === id);
  if (!flown)
    findings.push(
      atSortie("revision-not-stated", `Card ${number}: the revision flown is not stated. Ask the pilot; it is judged on ${letter}.`),
    );
  else if (flown.letter !== letter)
    findings.push(
      atSortie(
        "revision-mismatch",
        `Card ${number}: revision ${flown.letter} was flown, ${letter} is in force and is judged on. Compare the two.`,
      ),
    );
  const { configuration } = card.programme;
  if (configuration && context.configurationId === null)
    findings.push(
      atSortie("configuration-not-stated", `The sortie names no configuration; the card is for ${configuration.number}. State it.`),
    );
  const past = lines.some((line) => line.comparison !== "abort" && line.comparison !== "hot day, placard" && line.verdict === "exceeded");
  if (debrief.safety.limitExceeded === false && past)
    findings.push(
      atSortie("exceedance-not-noticed", "The pilot saw no limit exceeded, the corrected readings show one: tell the pilot.", "should"),
    );
  for (const report of reports) {
    const point = card.content.points.find((candidate) => candidate.id === report.point);
    if (point) findings.push(...pointFindings(point, debrief, lines, report));
  }
  return findings;
}

function atSortie(code: string, message: string, severity: Finding["severity"] = "must"): Finding {
  return { code, severity, message, where: { at: "sortie" } };
}

function pointFindings(point: CardPoint, debrief: Debrief, lines: readonly CheckLine[], report: PointReport): Finding[] {
  const said = debrief.points.find((candidate) => candidate.point === point.id);
  const at = (code: string, message: string, item: string, severity: Finding["severity"] = "should"): Finding => ({
    code,
    severity,
    message,
    where: { at: "point", point: point.id, field: "readings", item },
  });
  const unstated = said && said.outcome !== null && said.outcome !== "skipped" && said.onCondition === null;
  const condition = unstated
    ? [at("condition-not-stated", "The pilot did not say whether the point was on condition: ask.", "on condition")]
    : [];
  const label = (id: string) => point.readings.find((reading) => reading.id === id)?.label ?? id;
  const surprising = report.outsideExpected.map(({ reading }) => {
    const confirmed = said?.readings.find((entry) => entry.reading === reading)?.asRead === true;
    return confirmed
      ? at("outside-expected", `${label(reading)} is outside its expected band, as read: the prediction is off.`, reading)
      : at(
          "outside-expected-unconfirmed",
          `${label(reading)} is outside its expected band and not confirmed: ask the pilot "as read?".`,
          reading,
        );
  });
  const changed = (said?.readings ?? [])
    .filter((entry) => entry.unit !== null && point.readings.some((reading) => reading.id === entry.reading && reading.unit !== entry.unit))
    .map(({ reading }) =>
      at("gauge-changed", `${label(reading)} was read on a changed gauge: calibrate it, then check again.`, reading, "must"),
    );
  const past = new Set(lines.filter((line) => line.point === point.id && line.verdict === "exceeded").map((line) => line.reading));
  const strange = new Set(
    lines
      .filter(
        (line) =>
          line.point === point.id &&
          line.comparison !== "abort" &&
          !past.has(line.reading) &&
          line.notes.some((note) => note.endsWith("normal")),
      )
      .map((line) => line.reading),
  );
  const unusual = [...strange].map((reading) =>
    at(
      "outside-normal",
      `${label(reading)} is inside its limit but outside its normal range, as flown or on the hot day: say why in the line of the step decision.`,
      reading,
    ),
  );
  return [...condition, ...surprising, ...changed, ...unusual];
}
