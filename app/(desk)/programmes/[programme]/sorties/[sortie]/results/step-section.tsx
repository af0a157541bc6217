import { Section } from "@/components/ui/page-header";
import { formatInstant } from "@/lib/format/time";
import { asSentences } from "@/lib/format/words";
import type { Role } from "@/lib/testcards/words";
import { may, whoMay } from "@/lib/workflow/permissions";
import type { SortieResults } from "@/lib/workflow/sortie/queries";
import { countersignStepAction, decideStepAction } from "./actions";
import { Countersign, DecideStep } from "./step-forms";

type StepProps = { results: SortieResults; programmeId: string; roles: readonly Role[] };

/** The next step of the build-up: proposed as computed or stricter, countersigned by a reviewer; a hold needs nobody. */
export function StepSection({ results: { sortie, checks, decisions, may: mayHere }, programmeId, roles }: StepProps) {
  const points = checks.flatMap(({ card, report }) =>
    report.points.flatMap((point) => {
      const planned = card.document.content.points.find(({ id }) => id === point.point);
      return planned?.template && point.outcome !== "skipped" ? [{ revisionId: card.revisionId, planned, computed: point.decision }] : [];
    }),
  );
  const mayHold = may({ roles }, "say hold");
  return (
    <Section
      id="steps"
      title="May the next step be flown?"
      lead="The engineer proposes what was computed, or something stricter. It stands when a reviewer countersigns; an engineer, a reviewer, a pilot or a mechanic may hold."
    >
      <ul>
        {decisions.map((step) => (
          <li key={step.id} className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-rule border-b py-3">
            <p>
              <span className="font-bold">
                {step.step}: {step.decision}.
              </span>{" "}
              {asSentences(step.because)}
              <span className="block text-ink-soft text-sm">{standing(step)}</span>
            </p>
            {step.countersignedAt === null && step.decision !== "hold" && may({ roles }, "countersign a step") ? (
              <Countersign action={countersignStepAction.bind(null, programmeId, step.id)} decision={step.decision} />
            ) : null}
          </li>
        ))}
        {mayHere.proposeStep || mayHold
          ? points.map(({ revisionId, planned, computed }) => (
              <li key={planned.id} className="border-rule border-b py-3">
                <DecideStep
                  action={decideStepAction.bind(null, { programmeId, sortieId: sortie.id, revisionId, pointId: planned.id })}
                  name={planned.title}
                  computed={computed}
                  mayPropose={mayHere.proposeStep}
                />
              </li>
            ))
          : null}
      </ul>
      {mayHere.proposeStep || mayHold ? null : <p className="mt-3 text-ink-soft text-sm">{whoMay("say hold")}</p>}
    </Section>
  );
}

function standing(step: SortieResults["decisions"][number]): string {
  const proposed = step.proposedAt ? `Recorded ${formatInstant(step.proposedAt)}` : "";
  if (step.decision === "hold") return `${proposed}. A hold stands at once.`;
  return step.countersignedAt ? `${proposed}, countersigned ${formatInstant(step.countersignedAt)}.` : `${proposed}. Waits for a reviewer.`;
}
