/** One debrief against one card: every line, what it means for its point, and what follows for the next step. */

import { decideAfterFlight } from "./buildup";
import type { CardDocument, CardPoint } from "./card";
import { abortReport } from "./check-abort";
import { asFlownLine, type Subject } from "./check-as-flown";
import { completionOf } from "./check-completion";
import { findingsOf, outsideExpected, squawksOf, withheldOn } from "./check-follow-up";
import { gaugeOf } from "./check-gauge";
import { hotDayLine } from "./check-hot-day";
import { limitsOn } from "./check-limits";
import { debriefAsJudged } from "./debrief-as-judged";
import type { CheckContext, CheckLine, CheckReport, Debrief, PointReport } from "./debrief-types";
import { worst } from "./verdict";
import type { StepDecision, Verdict } from "./words";

/** Raised whenever a rule changes what a report would say, so that an earlier report can be told apart. */
export const CORE_VERSION = "1";

/**
 * Judges the debrief on the card's document: each reading against its abort number, as flown against card and placard, and on the hot day
 * against the placard; then completion, abort discipline, squawks and the proposed step decision.
 *
 * Source    [CFR-23.1043] and [JCGM-106] behind the modules it calls; the rules that join them are the team's own.
 * Inputs    the debrief as typed (raw stays raw: amendments stand beside it in the context). Points of other cards are left alone.
 * Throws    nothing on well-formed input. What is missing gives "no verdict" with its reason, never a pass.
 */
export function checkDebrief(card: CardDocument, debrief: Debrief, context: CheckContext): CheckReport {
  const judged = debriefAsJudged(card, debrief, context.amendments);
  const checked = card.content.points.map((point) => checkPoint(card, point, judged, context));
  const lines = checked.flatMap((one) => one.lines);
  const squawks = squawksOf(card, lines, judged);
  const groundingOpen = context.groundingOpen || squawks.some((squawk) => squawk.severity === "grounding");
  const points = checked.map((one) => ({ ...one.report, ...decide(one, context, groundingOpen) }));
  return {
    coreVersion: CORE_VERSION,
    card: { id: card.identity.id, number: card.identity.number, letter: card.identity.letter },
    basis: card.programme.hotDayBasis,
    lines,
    points,
    findings: findingsOf(card, judged, context, lines, points),
    squawks,
    ...overall(card, points),
  };
}

type Checked = {
  report: Omit<PointReport, "decision" | "because">;
  lines: CheckLine[];
  counting: Verdict[];
  withheld: Subject["withheld"];
};

function checkPoint(card: CardDocument, point: CardPoint, debrief: Debrief, context: CheckContext): Checked {
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
  const report = {
    point: point.id,
    outcome: said?.outcome ?? null,
    completion: completion.point.reason,
    completionWhy: completion.point.why,
    worst: counting.length === 0 ? ("no verdict" as const) : worst(counting),
    disciplines: aborts.disciplines,
    outsideExpected: subjects.flatMap((subject) => outsideExpected(subject) ?? []),
  };
  return { report, lines, counting, withheld };
}

function decide(
  { report, counting, withheld }: Checked,
  context: CheckContext,
  groundingOpen: boolean,
): Pick<PointReport, "decision" | "because"> {
  const decided = decideAfterFlight({
    start: context.starts?.find((one) => one.point === report.point)?.decision ?? "clear to next step",
    verdicts: counting,
    disciplines: report.disciplines.map(({ discipline }) => discipline),
    dispositions: context.dispositions.filter((one) => one.point === report.point).map((one) => one.disposition),
    outcomes: [report.outcome],
    groundingOpen,
    outsideExpected: report.outsideExpected.length > 0,
  });
  if (withheld.length === 0) return decided;
  // off condition, or in another configuration, a point says nothing about the step on its card, whatever its rule
  const why = withheld.map((one) => one.why);
  return { decision: "hold", because: decided.decision === "hold" ? [...decided.because, ...why] : why };
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
