import Link from "next/link";
import { PrintSheet } from "@/components/builder/print-sheet";
import { CardState } from "@/components/card/card-state";
import { AnswerCard } from "@/components/sortie/answer-card";
import { BriefForm } from "@/components/sortie/brief-form";
import { CancelSortie } from "@/components/sortie/end-sortie";
import { LoadingForm } from "@/components/sortie/loading-form";
import { SortieStateBadge } from "@/components/sortie/sortie-state";
import { buttonClass } from "@/components/ui/button";
import { Facts, PageHeader, Section } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatNumber } from "@/lib/format/number";
import { formatDay, formatInstant } from "@/lib/format/time";
import { asSentences, countOf } from "@/lib/format/words";
import { type LoadCase, planLoad } from "@/lib/testcards/card-plan";
import { shortDigest } from "@/lib/workflow/card/policy";
import { whoMay } from "@/lib/workflow/permissions";
import { getProgramme } from "@/lib/workflow/programme/queries";
import { getSortie, type SortieView } from "@/lib/workflow/sortie/queries";
import { orNotFound } from "../../../../or-not-found";
import { BinderPage } from "../../binder-page";

export const metadata = { title: "Sortie" };

type Props = { params: Promise<{ programme: string; sortie: string }> };

export default async function SortiePage({ params }: Props) {
  const { programme, sortie: id } = await params;
  const { db, actor, today } = await requestCtx();
  const view = orNotFound(() => getSortie(db, actor, id, { today }));
  const { settings } = orNotFound(() => getProgramme(db, actor, programme));
  const { sortie, debrief, may } = view;
  const here = `/programmes/${programme}`;
  const open = sortie.state === "planned" || sortie.state === "briefed";
  return (
    <BinderPage>
      <PageHeader
        title={`Sortie ${sortie.number}, ${sortie.kind}`}
        badge={<SortieStateBadge state={sortie.state} />}
        lead={`${formatDay(sortie.plannedOn)}, planned by ${sortie.plannedByName}`}
        actions={
          <>
            {debrief ? (
              <Link className={buttonClass("main")} href={`${here}/sorties/${id}/results`}>
                Results
              </Link>
            ) : may.debrief && sortie.state !== "planned" ? (
              <a className={buttonClass("outline")} href={`/debrief/${id}`}>
                Debrief on the phone
              </a>
            ) : may.change ? (
              <Link className={buttonClass("outline")} href={`${here}/sorties/${id}/change`}>
                Change the sortie
              </Link>
            ) : null}
            {may.cancel ? <CancelSortie sortieId={id} number={sortie.number} version={sortie.version} /> : null}
          </>
        }
      />
      {sortie.state === "closed" ? <p className="pb-6">{closedWords(view)}</p> : null}
      <Section id="cards" title="Cards">
        <ol className="flex flex-col">
          {view.cards.map((card, index) => (
            <CardOfSortie key={card.revisionId} card={card} index={index} sortieId={id} here={here} mayAnswer={may.answer} open={open} />
          ))}
        </ol>
        {open && !may.answer ? <p className="mt-3 text-ink-soft text-sm">{whoMay("accept cards")}</p> : null}
      </Section>
      {open ? (
        <Section id="brief" title="Before the brief" aside={may.brief ? undefined : whoMay("brief and debrief")}>
          <BriefForm
            key={sortie.version}
            sortieId={id}
            lines={settings.goNoGo}
            findings={view.findings}
            may={may.brief}
            briefed={sortie.state === "briefed"}
            kept={sortie.answers ?? {}}
          />
          {sortie.briefedAt ? (
            <p className="mt-3">
              Briefed {formatInstant(sortie.briefedAt)}
              {sortie.briefedByName ? ` by ${sortie.briefedByName}` : ""}.
            </p>
          ) : null}
        </Section>
      ) : null}
      {may.debrief && sortie.state === "planned" ? (
        <Section id="flown" title="Flown already?" lead="What happened may always be entered, briefed or not.">
          <a className={buttonClass("outline")} href={`/debrief/${id}`}>
            Debrief on the phone
          </a>
        </Section>
      ) : null}
      <Section id="loading" title="Crew and loading">
        <Loading view={view} />
        {open && may.answer ? (
          <details className="mt-4">
            <summary className="flex min-h-11 cursor-pointer items-center font-bold">Enter loading and the day’s plan</summary>
            <LoadingForm key={sortie.version} sortieId={id} version={sortie.version} settings={sortie.settings} />
          </details>
        ) : null}
      </Section>
    </BinderPage>
  );
}

type CardProps = { card: SortieView["cards"][number]; index: number; sortieId: string; here: string; mayAnswer: boolean; open: boolean };

function CardOfSortie({ card, index, sortieId, here, mayAnswer, open }: CardProps) {
  const current = card.answeredDigest === card.digest;
  return (
    <li className="grid gap-4 border-rule border-b py-4 hand:grid-cols-[1fr_auto]">
      <div>
        <p className="flex flex-wrap items-center gap-x-3 gap-y-1">
          <Link className="font-bold underline-offset-4 hover:underline" href={`${here}/cards/${card.cardId}?rev=${card.letter}`}>
            {index + 1}. Card {card.number} {card.document.content.title}
          </Link>
          <CardState state={card.state} letter={card.letter} />
        </p>
        <p className="text-ink-soft text-sm">
          {countOf(card.document.content.points.length, "point")}, digest <span className="font-mono">{shortDigest(card.digest)}</span>
        </p>
        <p className="mt-1">
          {card.answer === null
            ? "Not accepted yet."
            : `${card.answer === "accepted" ? "Accepted" : "Declined"} by ${card.answeredByName}, ${card.answeredAt ? formatInstant(card.answeredAt) : ""}${card.declineWhy ? `: ${card.declineWhy}` : "."}`}
          {card.answer && !current ? " The card changed since: read it again." : ""}
        </p>
      </div>
      <div className="flex flex-col items-start gap-2">
        {mayAnswer && card.state === "released" ? (
          <AnswerCard sortieId={sortieId} revisionId={card.revisionId} digest={card.digest} answered={current ? card.answer : null} />
        ) : null}
        {open ? <PrintSheet cardId={card.cardId} letter={card.letter} /> : null}
      </div>
    </li>
  );
}

function Loading({ view: { crew, sortie, cards, plan } }: { view: SortieView }) {
  const { baggageKg, fuelOnBoardL, forecastOatC, dayPlan } = sortie.settings;
  const stated = (value: string | null) => value ?? "not stated";
  const programme = cards[0]?.document.programme;
  const points = cards.flatMap(({ document }) => document.content.points);
  const load = programme ? planLoad(programme, { kind: sortie.kind, crew: plan.crew, baggageKg, fuelOnBoardL, points }) : null;
  const unlike = cards.filter(
    ({ document: { content } }) => content.fuelOnBoardL !== null && fuelOnBoardL !== null && content.fuelOnBoardL !== fuelOnBoardL,
  );
  return (
    <>
      <Facts
        items={[
          ...crew.map(({ name, role, massKg }) => ({ term: `${role}, ${name}`, value: `${massKg} kg` })),
          { term: "Baggage", value: `${formatNumber(baggageKg)} kg` },
          { term: "Fuel on board", value: fuelOnBoardL === null ? "not stated" : `${formatNumber(fuelOnBoardL)} L` },
          { term: "Configuration", value: sortie.configurationNumber ?? "not stated" },
          { term: "Forecast outside air", value: forecastOatC === null ? "not stated" : `${formatNumber(forecastOatC)} °C` },
          { term: "Daylight", value: stated(dayPlan.daylight) },
          { term: "Duty time", value: stated(dayPlan.dutyTime) },
          { term: "Runway", value: stated(dayPlan.runway) },
          ...(load
            ? [
                { term: "Fuel required", value: `${formatNumber(Math.ceil(load.fuelRequiredL))} L` },
                { term: "Take-off mass and CG", value: loadWords(load.takeOff) },
                { term: "Landing mass and CG", value: loadWords(load.landing) },
                { term: "Zero-fuel mass and CG", value: loadWords(load.zeroFuel) },
              ]
            : []),
        ]}
      />
      {unlike.map(({ number, letter, document: { content } }) => (
        <p key={number} className="mt-3">
          Card {number} rev {letter} prints {formatNumber(content.fuelOnBoardL ?? 0)} L on its cover, this sortie carries{" "}
          {formatNumber(fuelOnBoardL ?? 0)} L.
        </p>
      ))}
    </>
  );
}

/** A sortie closed without a debrief was cancelled: nothing of it was flown. */
function closedWords({ sortie: { closedAt, closedByName, closedWhy }, debrief }: SortieView): string {
  const when = `${debrief ? "Closed" : "Cancelled"}${closedAt ? ` ${formatInstant(closedAt)}` : ""}${closedByName ? ` by ${closedByName}` : ""}`;
  return asSentences([when, ...(closedWhy ? [closedWhy] : []), ...(debrief ? [] : ["Every point was skipped"])]);
}

function loadWords(load: LoadCase | null): string {
  if (!load) return "fuel not stated";
  return `${formatNumber(load.massKg, 1)} kg, ${formatNumber(load.cgM, 3)} m, ${load.inside ? "inside" : "OUTSIDE the envelope"}`;
}
