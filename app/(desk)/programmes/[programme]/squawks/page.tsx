import type { Metadata } from "next";
import Link from "next/link";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay, formatInstant } from "@/lib/format/time";
import { countOf } from "@/lib/format/words";
import { may, whoMay } from "@/lib/workflow/permissions";
import { listSorties } from "@/lib/workflow/sortie/queries";
import { listSquawks, type SquawkListItem } from "@/lib/workflow/squawk/queries";
import { orNotFound } from "../../../or-not-found";
import { BinderPage } from "../binder-page";
import { raiseSquawkAction } from "./actions";
import { RaiseSquawkForm } from "./raise-squawk-form";
import { SeverityMark } from "./severity-mark";

export const metadata: Metadata = { title: "Squawks" };

const ENDED = ["verified", "closed"];

export default async function SquawksPage({ params }: { params: Promise<{ programme: string }> }) {
  const [{ db, actor }, { programme: id }] = await Promise.all([requestCtx(), params]);
  const squawks = orNotFound(() => listSquawks(db, actor, id));
  const open = squawks.filter(({ state }) => !ENDED.includes(state));
  const grounding = open.filter(({ severity }) => severity === "grounding");
  const sorties = listSorties(db, actor, id).map(({ id: sortieId, number, kind, plannedOn }) => ({
    id: sortieId,
    label: `Sortie ${number}, ${kind}, ${formatDay(plannedOn)}`,
  }));
  return (
    <BinderPage>
      <PageHeader
        title="Squawks"
        lead={
          grounding.length > 0
            ? `${countOf(grounding.length, "grounding squawk")} open: no card is released and no sortie briefed until cleared.`
            : open.length > 0
              ? `${countOf(open.length, "squawk")} open, none of them grounding.`
              : "None is open."
        }
      />
      {squawks.length === 0 ? (
        <EmptyState title="No squawks">
          What was seen on the aircraft and must be looked at stands here. The debrief raises them; anybody who works on the aircraft may
          too.
        </EmptyState>
      ) : (
        <SquawkTable squawks={squawks} programmeId={id} />
      )}
      <div className="pt-10">
        <Section id="raise" title="Raise a squawk">
          {may(actor, "raise a squawk") ? (
            <RaiseSquawkForm action={raiseSquawkAction.bind(null, id)} sorties={sorties} />
          ) : (
            <p className="text-ink-soft">{whoMay("raise a squawk")}</p>
          )}
        </Section>
      </div>
    </BinderPage>
  );
}

function SquawkTable({ squawks, programmeId }: { squawks: SquawkListItem[]; programmeId: string }) {
  return (
    <Table label="Squawks">
      <TableHead>
        <HeadCell figures>No.</HeadCell>
        <HeadCell className="max-hand:hidden">Severity</HeadCell>
        <HeadCell>What was seen</HeadCell>
        <HeadCell>State</HeadCell>
        <HeadCell className="max-hand:hidden">From</HeadCell>
        <HeadCell className="max-hand:hidden">Raised</HeadCell>
      </TableHead>
      <tbody>
        {squawks.map((squawk) => (
          <SquawkLine key={squawk.id} squawk={squawk} programmeId={programmeId} />
        ))}
      </tbody>
    </Table>
  );
}

/** On a phone the severity stands under what was seen; where it came from stands on the squawk's own page. */
function SquawkLine({ squawk, programmeId }: { squawk: SquawkListItem; programmeId: string }) {
  const severity = <SeverityMark severity={squawk.severity} ended={ENDED.includes(squawk.state)} />;
  return (
    <Row id={`squawk-${squawk.number}`}>
      <Cell figures>{squawk.number}</Cell>
      <Cell className="max-hand:hidden">{severity}</Cell>
      <RowHead className="hand:min-w-64">
        <Link href={`/programmes/${programmeId}/squawks/${squawk.id}`} className="link py-1 [overflow-wrap:anywhere]">
          <span className="font-bold">{squawk.system}</span> {squawk.text}
        </Link>
        <span className="block pt-1 hand:hidden">{severity}</span>
      </RowHead>
      <Cell>
        {squawk.state}
        {squawk.disposition ? <span className="block text-ink-soft text-sm">{squawk.disposition}</span> : null}
      </Cell>
      <Cell className="whitespace-nowrap max-hand:hidden">
        {squawk.sortieId ? (
          <Link href={`/programmes/${programmeId}/sorties/${squawk.sortieId}`} className="link py-1">
            Sortie {squawk.sortieNumber}
          </Link>
        ) : (
          "a person"
        )}
      </Cell>
      <Cell className="min-w-40 max-hand:hidden">
        {formatInstant(squawk.raisedAt)}
        <span className="block text-ink-soft text-sm">
          {squawk.raisedFrom === "exceedance" ? "by the check of readings" : squawk.raisedByName}
        </span>
      </Cell>
    </Row>
  );
}
