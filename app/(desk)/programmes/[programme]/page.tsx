import type { Metadata } from "next";
import Link from "next/link";
import { buttonClass } from "@/components/ui/button";
import { PageHeader } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import {
  getProgramme,
  listConfigurations,
  listHazards,
  listInstruments,
  listObjectives,
  listParameters,
  listTestPoints,
} from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../or-not-found";
import { AircraftSection } from "./aircraft-section";
import { BinderPage } from "./binder-page";
import { ConfigurationSection } from "./configuration-section";
import { HazardsSection } from "./hazards-section";
import { InstrumentsSection } from "./instruments-section";
import { ObjectivesSection } from "./objectives-section";
import { RulesSection } from "./rules-section";

type Params = { params: Promise<{ programme: string }> };

const PARTS = [
  ["objectives", "Objectives"],
  ["aircraft", "Aircraft"],
  ["configuration", "Configuration"],
  ["instruments", "Instruments"],
  ["hazards", "Hazards"],
  ["rules", "Rules"],
] as const;

export async function generateMetadata({ params }: Params): Promise<Metadata> {
  const [{ db, actor }, { programme }] = await Promise.all([requestCtx(), params]);
  return { title: orNotFound(() => getProgramme(db, actor, programme)).name };
}

export default async function ProgrammePage({ params }: Params) {
  const [{ db, actor, today }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const programme = orNotFound(() => getProgramme(db, actor, id));
  const parameters = listParameters(db, actor, id);
  const points = listTestPoints(db, actor, id);
  return (
    <BinderPage>
      <PageHeader
        title={programme.name}
        lead={
          <>
            {programme.aircraft.type}, {programme.aircraft.registration}. {programme.aircraft.engine}.{" "}
            {programme.summary ? <span>{programme.summary}</span> : null}
          </>
        }
        actions={
          <Link href={`/programmes/${id}/ladder`} className={buttonClass("outline")}>
            Ladder: what is cleared
          </Link>
        }
      />
      <nav aria-label="On this page" className="pb-8">
        <ul className="flex flex-wrap gap-x-6 gap-y-1">
          {PARTS.map(([part, label]) => (
            <li key={part}>
              <a href={`#${part}`} className="link inline-flex min-h-11 items-center">
                {label}
              </a>
            </li>
          ))}
        </ul>
      </nav>
      <ObjectivesSection objectives={listObjectives(db, actor, id)} points={points} programmeId={id} />
      <AircraftSection aircraft={programme.aircraft} airfield={programme.settings.airfield} fuelPlan={programme.settings.fuelPlan} />
      <ConfigurationSection configurations={listConfigurations(db, actor, id)} controls={programme.settings.controls} />
      <InstrumentsSection instruments={listInstruments(db, actor, id)} parameters={parameters} today={today} />
      <HazardsSection hazards={listHazards(db, actor, id)} />
      <RulesSection settings={programme.settings} hotDayBasis={programme.hotDayBasis} instruments={listInstruments(db, actor, id)} />
    </BinderPage>
  );
}
