import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { Badge } from "@/components/ui/badge";
import { Facts, PageHeader, Section } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatInstant } from "@/lib/format/time";
import { listSquawkHistory, type SquawkEvent } from "@/lib/workflow/squawk/history";
import { isFixedGrounding, NEXT } from "@/lib/workflow/squawk/policy";
import { getSquawk, type SquawkListItem, squawkMay } from "@/lib/workflow/squawk/queries";
import { orNotFound } from "../../../../or-not-found";
import { BinderPage } from "../../binder-page";
import { SeverityMark } from "../severity-mark";
import { acceptAction, assessAction, closeAction, rectifyAction, verifyAction } from "./actions";
import { historyWords } from "./history-words";
import { AcceptForm, AssessForm, CloseForm, RectifyForm, VerifyForm } from "./squawk-forms";

export const metadata: Metadata = { title: "Squawk" };

type Props = { params: Promise<{ programme: string; squawk: string }> };

export default async function SquawkPage({ params }: Props) {
  const [{ db, actor }, { programme, squawk: id }] = await Promise.all([requestCtx(), params]);
  const squawk = orNotFound(() => getSquawk(db, actor, id));
  if (squawk.programmeId !== programme) notFound();
  const history = listSquawkHistory(db, actor, id);
  const ended = squawk.state === "verified" || squawk.state === "closed";
  return (
    <BinderPage>
      <PageHeader
        title={`Squawk ${squawk.number}, ${squawk.system}`}
        badge={
          <>
            <SeverityMark severity={squawk.severity} ended={ended} />
            <Badge>{squawk.state}</Badge>
          </>
        }
        lead={
          <Link className="link inline-block py-2" href={`/programmes/${programme}/squawks`}>
            All squawks
          </Link>
        }
      />
      <Section id="seen" title="What was seen">
        <p className="max-w-prose pb-4 text-lg [overflow-wrap:anywhere]">{squawk.text}</p>
        <Facts items={factsOf(squawk, programme)} columns={1} />
      </Section>
      {squawk.state === "closed" ? null : (
        <Section
          id="next"
          title="What is next"
          lead={
            squawk.severity === "grounding" && !ended
              ? "No card is released and no sortie briefed until this squawk is verified."
              : undefined
          }
        >
          <NextForms squawk={squawk} programmeId={programme} may={squawkMay(actor, squawk)} />
        </Section>
      )}
      <Section id="history" title="History">
        <History events={history} />
      </Section>
    </BinderPage>
  );
}

type NextProps = { squawk: SquawkListItem; programmeId: string; may: ReturnType<typeof squawkMay> };

/** Only what this person may do; otherwise whose turn it is. */
function NextForms({ squawk, programmeId, may }: NextProps) {
  const { id, state, severity } = squawk;
  const shown = { programmeId, squawkId: id, from: state };
  const assess = (
    <AssessForm
      key={`assess-${state}`}
      action={assessAction.bind(null, shown)}
      severity={severity}
      fixed={isFixedGrounding(squawk)}
      again={state === "assessed"}
    />
  );
  return (
    <>
      <p className="pb-4">
        {NEXT[state]?.by}
        {state === "assessed" && severity !== "grounding" ? " Or an engineer defers it with a limit, or accepts it as is." : ""}
      </p>
      {may.assess && state === "open" ? assess : null}
      {may.verify ? <VerifyForm action={verifyAction.bind(null, shown)} grounding={severity === "grounding"} /> : null}
      {may.rectify ? (
        <RectifyForm key={`rectify-${state}`} action={rectifyAction.bind(null, shown)} again={state === "dispositioned"} />
      ) : null}
      {may.accept ? <AcceptForm key={`accept-${state}`} action={acceptAction.bind(null, shown)} /> : null}
      {may.close ? <CloseForm action={closeAction.bind(null, shown)} /> : null}
      {may.assess && state === "assessed" ? assess : null}
    </>
  );
}

function factsOf(squawk: SquawkListItem, programme: string) {
  const { sortieId, sortieNumber, raisedFrom, raisedByName, raisedAt, disposition, dispositionLimit, entryReference, verifiedReference } =
    squawk;
  const raiser = { exceedance: "the check of readings", debrief: `${raisedByName}, in the debrief`, person: raisedByName }[raisedFrom];
  return [
    { term: "Raised", value: `${formatInstant(raisedAt)} by ${raiser}` },
    ...(sortieId
      ? [
          {
            term: "Sortie",
            value: (
              <Link className="link inline-block py-1" href={`/programmes/${programme}/sorties/${sortieId}`}>
                Sortie {sortieNumber}
              </Link>
            ),
          },
        ]
      : []),
    ...(disposition ? [{ term: "Disposition", value: disposition }] : []),
    ...(dispositionLimit ? [{ term: "Limit", value: dispositionLimit }] : []),
    ...(entryReference ? [{ term: "Entry of the work", value: entryReference }] : []),
    ...(verifiedReference
      ? [{ term: squawk.severity === "grounding" ? "Licensed person's entry" : "Entry at verification", value: verifiedReference }]
      : []),
  ];
}

function History({ events }: { events: SquawkEvent[] }) {
  return (
    <ol>
      {events.map((event) => (
        <li key={event.at + event.action} className="grid gap-x-6 gap-y-1 border-rule border-b py-3 hand:grid-cols-[14rem_1fr]">
          <p className="text-ink-soft">
            {formatInstant(event.at)}
            <span className="block">{event.actorName}</span>
          </p>
          <p className="[overflow-wrap:anywhere]">{historyWords(event)}</p>
        </li>
      ))}
    </ol>
  );
}
