import { Badge, type BadgeTone } from "@/components/ui/badge";
import { classNames } from "@/components/ui/class-names";
import { Section } from "@/components/ui/page-header";
import type { Hazard } from "@/lib/testcards/card";
import { riskLevel } from "@/lib/testcards/risk";
import { type HazardSeverity, PROBABILITIES, type Probability, type RiskLevel } from "@/lib/testcards/words";

const SEVERITIES: [HazardSeverity, string][] = [
  [1, "Catastrophic"],
  [2, "Critical"],
  [3, "Marginal"],
  [4, "Negligible"],
];
const FREQUENCY: Record<Probability, string> = {
  A: "Frequent",
  B: "Probable",
  C: "Occasional",
  D: "Remote",
  E: "Improbable",
  F: "Eliminated",
};
const TONE: Record<RiskLevel, BadgeTone> = { High: "red", Serious: "yellow", Medium: "blue", Low: "green", Eliminated: "plain" };
const WASH: Record<RiskLevel, string> = {
  High: "bg-wash-red",
  Serious: "bg-wash-yellow",
  Medium: "bg-wash-blue",
  Low: "bg-wash-green",
  Eliminated: "bg-wash-grey",
};

const levelOf = ({ severity, probability }: Hazard["before"]) => riskLevel(severity, probability);

export function HazardsSection({ hazards }: { hazards: Hazard[] }) {
  return (
    <Section
      id="hazards"
      title="Hazards"
      lead="Each hazard stands in the matrix where it is left after its mitigations. Low and Medium may be accepted by any reviewer, Serious only by one named for it, High by nobody."
    >
      <Matrix hazards={hazards} />
      <ul className="pt-6">
        {hazards.map((hazard) => (
          <HazardLine key={hazard.code} hazard={hazard} />
        ))}
      </ul>
    </Section>
  );
}

/** MIL-STD-882E Table III, with the codes in their cells. */
function Matrix({ hazards }: { hazards: Hazard[] }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolling region must be reachable by key.
    // biome-ignore lint/a11y/useSemanticElements: a fieldset holds controls, this a table.
    <div role="group" aria-label="Risk matrix" tabIndex={0} className="relative overflow-x-auto">
      <table className="w-full min-w-[40rem] table-fixed border-collapse">
        <caption className="sr-only">Risk matrix after mitigations</caption>
        <thead>
          <tr className="border-ink border-b-[1.5px] text-ink-soft text-sm">
            <td className="w-36" />
            {SEVERITIES.map(([severity, name]) => (
              <th key={severity} scope="col" className="px-2 py-2">
                {severity} {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {PROBABILITIES.map((probability) => (
            <tr key={probability}>
              <th scope="row" className="border-rule border-b pe-2 text-ink-soft text-sm">
                {probability} {FREQUENCY[probability]}
              </th>
              {SEVERITIES.map(([severity]) => {
                const level = riskLevel(severity, probability);
                const here = hazards.filter(({ after }) => after.severity === severity && after.probability === probability);
                return (
                  <td key={severity} className={classNames("h-12 border border-sheet px-2 py-1 align-top", WASH[level])}>
                    <span className="block text-ink text-sm">{level}</span>
                    <span className="font-bold">{here.map(({ code }) => code).join(" ")}</span>
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function HazardLine({ hazard }: { hazard: Hazard }) {
  const { code, title, cause, effect, before, after, mitigations, owner } = hazard;
  const grade = (at: Hazard["before"]) => `${at.severity}${at.probability} ${levelOf(at)}`;
  return (
    <li id={code} className="grid gap-x-8 gap-y-2 border-rule border-b py-4 desk:grid-cols-[1fr_1fr_12rem]">
      <div>
        <h3 className="font-bold">
          {code} {title}
        </h3>
        <p>
          <span className="text-ink-soft">Cause</span> {cause}
        </p>
        <p>
          <span className="text-ink-soft">Effect</span> {effect}
        </p>
      </div>
      <ul className="list-disc ps-5">
        {mitigations.map(({ kind, text }) => (
          <li key={text}>
            {text} <span className="text-ink-soft text-sm">({kind})</span>
          </li>
        ))}
      </ul>
      <div className="flex flex-wrap content-start items-center gap-2 desk:flex-col desk:items-start">
        <Badge tone={TONE[levelOf(before)]}>before {grade(before)}</Badge>
        <Badge tone={TONE[levelOf(after)]}>after {grade(after)}</Badge>
        <span className="text-ink-soft text-sm">{owner}</span>
      </div>
    </li>
  );
}
