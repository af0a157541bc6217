import Link from "next/link";
import { SortieStateBadge } from "@/components/sortie/sortie-state";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay } from "@/lib/format/time";
import { countOf } from "@/lib/format/words";
import { listProgrammes, type ProgrammeListItem } from "@/lib/workflow/programme/queries";
import { listWaiting } from "@/lib/workflow/sortie/flight-line";
import { listSorties, type SortieListItem } from "@/lib/workflow/sortie/queries";
import { waitingLine } from "./waiting-words";

const SHOWN_SORTIES = 6;

export default async function FlightLinePage() {
  const { db, actor, today } = await requestCtx();
  const waiting = listWaiting(db, actor).map(waitingLine);
  const programmes = listProgrammes(db, actor);
  return (
    <main className="mx-auto w-full max-w-6xl grow px-4 py-8 desk:px-6">
      <PageHeader
        title="Flight line"
        lead={
          waiting.length === 0
            ? `${formatDay(today)}.`
            : `${formatDay(today)}. ${countOf(waiting.length, "thing")} ${waiting.length === 1 ? "waits" : "wait"} for you.`
        }
      />
      <Section id="waiting" title="Waits for you">
        {waiting.length === 0 ? (
          <EmptyState title="Nothing waits for you">What you must write, review, accept, debrief or clear stands here.</EmptyState>
        ) : (
          <ul className="border-rule border-t">
            {waiting.map(({ key, head, text, address }) => (
              <li key={key} className="border-rule border-b">
                <Link href={address} className="flex min-h-14 flex-wrap content-center items-baseline gap-x-4 py-3 hover:bg-wash-grey">
                  <span className="font-bold underline decoration-1 underline-offset-3">{head}</span>
                  <span className="text-ink-soft [overflow-wrap:anywhere]">{text}</span>
                </Link>
              </li>
            ))}
          </ul>
        )}
      </Section>
      {programmes.length === 0 ? (
        <EmptyState title="No programme yet">A programme holds an aircraft, its limits, its test points and its cards.</EmptyState>
      ) : (
        programmes.map((programme) => (
          <ProgrammePart key={programme.id} programme={programme} sorties={listSorties(db, actor, programme.id)} />
        ))
      )}
    </main>
  );
}

function ProgrammePart({ programme, sorties }: { programme: ProgrammeListItem; sorties: SortieListItem[] }) {
  const address = `/programmes/${programme.id}`;
  return (
    <Section id={`programme-${programme.id}`} title={programme.name} aside={`${programme.type}, ${programme.registration}`}>
      <p className="flex flex-wrap items-baseline gap-x-6 gap-y-1 pb-4">
        <Link href={address} className="link inline-block py-2 font-bold">
          Open the programme
        </Link>
        {programme.summary ? <span>{programme.summary}</span> : null}
        {programme.notice && !programme.summary.includes(programme.notice) ? (
          <span className="text-ink-soft">{programme.notice}</span>
        ) : null}
      </p>
      {sorties.length === 0 ? (
        <EmptyState title="No sorties yet">A sortie takes released cards to a day, a crew and a configuration.</EmptyState>
      ) : (
        <SortieTable sorties={sorties.slice(0, SHOWN_SORTIES)} address={address} more={sorties.length > SHOWN_SORTIES} />
      )}
    </Section>
  );
}

function SortieTable({ sorties, address, more }: { sorties: SortieListItem[]; address: string; more: boolean }) {
  return (
    <>
      <Table label="Sorties">
        <TableHead>
          <HeadCell>Sortie</HeadCell>
          <HeadCell>Day</HeadCell>
          <HeadCell className="max-hand:hidden">Cards</HeadCell>
          <HeadCell className="max-hand:hidden">Pilot</HeadCell>
          <HeadCell>State</HeadCell>
        </TableHead>
        <tbody>
          {sorties.map(({ id, number, kind, plannedOn, cards, pilot, state }) => (
            <Row key={id}>
              <RowHead>
                <Link href={`${address}/sorties/${id}`} className="link whitespace-nowrap py-1 font-bold">
                  Sortie {number}
                </Link>
                <span className="whitespace-nowrap text-ink-soft max-hand:block">
                  <span className="max-hand:hidden">, </span>
                  {kind}
                </span>
              </RowHead>
              <Cell className="whitespace-nowrap">{formatDay(plannedOn)}</Cell>
              <Cell className="max-hand:hidden">{cards ?? "none"}</Cell>
              <Cell className="max-hand:hidden">{pilot ?? "not named"}</Cell>
              <Cell>
                <SortieStateBadge state={state} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      {more ? (
        <p className="pt-2">
          <Link href={`${address}/sorties`} className="link inline-block py-2">
            All sorties
          </Link>
        </p>
      ) : null}
    </>
  );
}
