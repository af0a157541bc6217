import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { Badge } from "@/components/ui/badge";
import { Facts, PageHeader, Section } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatNumber } from "@/lib/format/number";
import { formatMinutes, formatStopwatch } from "@/lib/format/time";
import { formatQuantity } from "@/lib/format/unit";
import type { CardPoint } from "@/lib/testcards/card";
import { listTestPoints } from "@/lib/workflow/programme/queries";
import { getProgrammeSnapshot } from "@/lib/workflow/programme/snapshot";
import { orNotFound } from "../../../../or-not-found";
import { BinderPage } from "../../binder-page";
import { highestRisk, RISK_TONE } from "../risk-of-point";
import { PointStops } from "./point-stops";
import { ReadingsTable } from "./readings-table";

type Params = { params: Promise<{ programme: string; code: string }> };

async function read({ params }: Params) {
  const [ctx, { programme, code }] = await Promise.all([requestCtx(), params]);
  const point = orNotFound(() => listTestPoints(ctx.db, ctx.actor, programme)).find((each) => each.code === code);
  if (!point) notFound();
  return { ...ctx, programmeId: programme, point };
}

export async function generateMetadata(params: Params): Promise<Metadata> {
  const { point } = await read(params);
  return { title: `${point.code} ${point.title}` };
}

export default async function TestPointPage(params: Params) {
  const { db, actor, programmeId, point } = await read(params);
  const programme = getProgrammeSnapshot(db, actor, programmeId);
  const { content } = point;
  const risk = highestRisk(content, programme.hazards);
  return (
    <BinderPage>
      <p className="pb-3">
        <Link href={`/programmes/${programmeId}/test-points`} className="link inline-block py-2">
          Test points
        </Link>
      </p>
      <PageHeader
        title={`${point.code} ${point.title}`}
        lead={content.purpose}
        badge={risk ? <Badge tone={RISK_TONE[risk]}>{risk} risk</Badge> : null}
        actions={<span className="text-ink-soft">revision {point.revision}</span>}
      />
      <Section id="entry" title="Entry">
        <p className="text-lg">
          <strong>{content.positions.map(({ control, position }) => `${control} ${position}`).join("  ")}</strong> {content.entryText}
        </p>
        <ol className="list-[lower-alpha] ps-6 pt-3">
          {content.steps.map((step) => (
            <li key={step.id} className="py-0.5">
              {step.text}
              {step.durationS === null ? null : <span className="text-ink-soft"> ({formatStopwatch(step.durationS)})</span>}
            </li>
          ))}
        </ol>
        {content.recovery ? (
          <p className="pt-3">
            <strong>Recover</strong> {content.recovery}
          </p>
        ) : null}
      </Section>
      <Section id="readings" title="Readings" aside={`complete when: ${completionWords(content)}`}>
        <ReadingsTable point={content} programme={programme} />
      </Section>
      <PointStops point={content} programme={programme} />
      <Section id="plan" title="Plan">
        <Facts
          items={planFacts(
            content,
            programme.hazards.map(({ code, title }) => ({ code, title })),
          )}
        />
      </Section>
    </BinderPage>
  );
}

function completionWords({ completion: { rule, runS, pastPeakS } }: CardPoint): string {
  if (rule === "whole run" && runS !== null) return `whole run, ${formatStopwatch(runS)}`;
  if (rule === "whole run" && pastPeakS !== null) return `whole run, to the peak plus ${formatStopwatch(pastPeakS)}`;
  return rule;
}

function planFacts(point: CardPoint, hazards: { code: string; title: string }[]) {
  const yes = [
    point.firstFlight ? "first flight" : "",
    point.minimumCrewOnly ? "minimum crew only" : "",
    point.smoothAir ? "smooth air" : "",
    point.soak ? "heat soak, ends a card" : "",
    point.needsHeightFloor ? "needs a minimum height" : "",
  ].filter(Boolean);
  const floor = point.heightFloor;
  return [
    { term: "Where", value: `${point.place === "air" ? "in the air" : "on the ground"}, engine ${point.engine}` },
    { term: "Order", value: point.order },
    { term: "Takes", value: formatMinutes(point.durationMin) },
    { term: "Fuel flow", value: formatQuantity({ value: point.fuelFlowLPerH, unit: "L/h" }) },
    { term: "Height at least", value: floor ? `${formatNumber(floor.value)} ${floor.unit} ${floor.reference}` : "none set" },
    { term: "After", value: point.parents.join(", ") || "nothing before it" },
    { term: "Changes", value: point.changes.join(", ") || "nothing" },
    { term: "Objectives", value: point.objectives.join(", ") || "none" },
    {
      term: "Hazards",
      value:
        hazards
          .filter(({ code }) => point.hazards.includes(code))
          .map(({ code, title }) => `${code} ${title}`)
          .join("; ") || "none named",
    },
    ...(point.series
      ? [{ term: "Series", value: `${point.series.name}, ${formatQuantity(point.series.level)}${point.series.base ? ", base point" : ""}` }]
      : []),
    ...(yes.length > 0 ? [{ term: "Kept to", value: yes.join(", ") }] : []),
  ];
}
