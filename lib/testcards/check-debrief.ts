/** One debrief against one card: every line, what it means for its point, and what follows for the next step. */

import { amended } from "./amend-debrief";
import { decideAfterFlight } from "./buildup";
import type { CardDocument, CardPoint } from "./card";
import { abortReport } from "./check-abort";
import { asFlownLine, type Subject } from "./check-as-flown";
import { completionOf } from "./check-completion";
import { findingsOf, outsideExpected, squawksOf, withheldOn } from "./check-follow-up";
import { gaugeOf } from "./check-gauge";
import { hotDayLine } from "./check-hot-day";
import { limitsOn } from "./check-limits";
import type { CheckContext, CheckLine, CheckReport, Debrief, PointReport } from "./debrief-types";
import { worst } from "./verdict";
import type { StepDecision, Verdict } from "./words";

/** Raised whenever a rule changes what a report would say, so that an earlier report can be told apart. */
export const CORE_VERSION = "1";

/**
 * Judges the debrief on the card's document: each reading against its abort number, as flown against card and placard, and on the hot day
 * against the placard; then completion, abort discipline, squawks and the proposed step decision.
 *
 * Source    [14 CFR 23.1043] and [JCGM 106] behind the modules it calls; the rules that join them are the team's own.
 * Inputs    the debrief as typed (raw stays raw: amendments stand beside it in the context). Points of other cards are left alone.
 * Throws    nothing on well-formed input. What is missing gives "no verdict" with its reason, never a pass.
 */
export function checkDebrief(card: CardDocument, debrief: Debrief, context: CheckContext): CheckReport {
  const judgedOn = amended(card, debrief, context.amendments);
  const checked = card.content.points.map((point) => checkPoint(card, point, judgedOn, context));
  const lines = checked.flatMap((one) => one.lines);
  const points = checked.map((one) => one.report);
  return {
    coreVersion: CORE_VERSION,
    card: { id: card.identity.id, number: card.identity.number, letter: card.identity.letter },
    basis: card.programme.hotDayBasis,
    lines,
    points,
    findings: findingsOf(card, judgedOn, lines, points),
    squawks: squawksOf(card, lines, judgedOn, card.content.points),
    ...overall(card, points),
  };
}

function checkPoint(
  card: CardDocument,
  point: CardPoint,
  debrief: Debrief,
  context: CheckContext,
): { report: PointReport; lines: CheckLine[] } {
  const said = debrief.points.find((candidate) => candidate.point === point.id) ?? null;
  const completion = completionOf(card, point, said, context);
  const withheld = withheldOn(card, point, said, context);
  const subjects = point.readings
    .filter((reading) => reading.kind === "number" || reading.kind === "count")
    .map((reading): Subject => {
      const entry = said?.readings.find((candidate) => candidate.reading === reading.id) ?? null;
      return { card, point, debrief, said, reading, entry, gauge: gaugeOf(card, reading, entry, context), context, withheld };
    });
  const aborts = abortReport(card, point, said, debrief);
  const lines = subjects.flatMap((subject) => [
    ...aborts.lines.filter((line) => line.reading === subject.reading.id),
    ...limitsOn(card, point, subject.reading).flatMap((limit) =>
      [asFlownLine(subject, limit), hotDayLine(subject, limit, completion.of(subject.reading))].filter((line) => line !== null),
    ),
  ]);
  const counting = verdictsThatCount(lines);
  const surprises = subjects.flatMap((subject) => outsideExpected(subject) ?? []);
  const dispositions = context.dispositions.filter((one) => one.point === point.id).map((one) => one.disposition);
  const decided = decideAfterFlight({
    start: context.starts?.find((one) => one.point === point.id)?.decision ?? "clear to next step",
    verdicts: counting,
    disciplines: aborts.disciplines.map(({ discipline }) => discipline),
    dispositions,
    outcomes: [said?.outcome ?? null],
    groundingOpen: context.groundingOpen || squawksOf(card, lines, debrief, [point]).some((squawk) => squawk.severity === "grounding"),
    outsideExpected: surprises.length > 0,
  });
  const report: PointReport = {
    point: point.id,
    outcome: said?.outcome ?? null,
    completion: completion.point.reason,
    completionWhy: completion.point.why,
    worst: counting.length === 0 ? "no verdict" : worst(counting),
    disciplines: aborts.disciplines,
    outsideExpected: surprises,
    ...decided,
  };
  return { report, lines };
}

/** Whatever is required, and whatever was found against a limit although nobody had to look. */
function verdictsThatCount(lines: readonly CheckLine[]): Verdict[] {
  return lines
    .filter((line) => line.comparison !== "abort" && (line.required || (line.verdict !== "no verdict" && !line.informationOnly)))
    .map((line) => line.verdict);
}

/** The sternest of the points'. A card without a point proves nothing: hold. */
function overall(card: CardDocument, points: readonly PointReport[]): { decision: StepDecision; because: string[] } {
  const sternness: StepDecision[] = ["hold", "smaller step", "clear to next step"];
  const decision = points.length === 0 ? "hold" : (sternness.find((word) => points.some((point) => point.decision === word)) ?? "hold");
  const title = (id: string) => card.content.points.find((point) => point.id === id)?.title ?? id;
  const because = points
    .filter((point) => point.decision === decision)
    .map((point) => `${title(point.point)}: ${point.because.join(", ")}`);
  return { decision, because: points.length === 0 ? ["the card has no points"] : because };
}
