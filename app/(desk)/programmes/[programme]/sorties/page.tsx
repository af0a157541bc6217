import { Plus } from "lucide-react";
import Link from "next/link";
import { SortieStateBadge } from "@/components/sortie/sortie-state";
import { buttonClass } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay } from "@/lib/format/time";
import { may } from "@/lib/workflow/permissions";
import { listSorties, type SortieListItem } from "@/lib/workflow/sortie/queries";
import { BinderPage } from "../binder-page";

export const metadata = { title: "Sorties" };

export default async function SortiesPage({ params }: { params: Promise<{ programme: string }> }) {
  const { programme } = await params;
  const { db, actor } = await requestCtx();
  const sorties = listSorties(db, actor, programme);
  const here = `/programmes/${programme}/sorties`;
  const plan = may(actor, "plan sorties") ? (
    <Link href={`${here}/new`} className={buttonClass("main")}>
      <Plus aria-hidden className="size-5" /> Plan a sortie
    </Link>
  ) : null;
  return (
    <BinderPage>
      <PageHeader
        title="Sorties"
        lead="Ground runs, taxi runs, flights and inspections: planned, briefed, flown, debriefed."
        actions={plan}
      />
      {sorties.length === 0 ? (
        <EmptyState title="No sortie yet." action={plan}>
          A sortie takes released cards to the aircraft: kind, day, crew and configuration. The pilot accepts each card before the brief.
        </EmptyState>
      ) : (
        <Table label="Sorties">
          <TableHead>
            <HeadCell>Sortie</HeadCell>
            <HeadCell>Planned</HeadCell>
            <HeadCell>State</HeadCell>
            <HeadCell className="max-hand:hidden">Cards</HeadCell>
            <HeadCell className="max-hand:hidden">Pilot</HeadCell>
            <HeadCell>Result</HeadCell>
          </TableHead>
          <tbody>
            {sorties.map((sortie) => (
              <Row key={sortie.id}>
                <RowHead>
                  <Link className="py-1 font-bold underline-offset-4 hover:underline" href={`${here}/${sortie.id}`}>
                    {sortie.number} {sortie.kind}
                  </Link>
                </RowHead>
                <Cell className="hand:whitespace-nowrap">{formatDay(sortie.plannedOn)}</Cell>
                <Cell>
                  <SortieStateBadge state={sortie.state} />
                </Cell>
                <Cell className="max-hand:hidden">{sortie.cards}</Cell>
                <Cell className="max-hand:hidden">{sortie.pilot ?? "—"}</Cell>
                <Cell>
                  {sortie.submittedAt ? (
                    <Link className="underline underline-offset-4" href={`${here}/${sortie.id}/results`}>
                      Results
                    </Link>
                  ) : (
                    <span className="text-ink-soft">{notFlown(sortie)}</span>
                  )}
                </Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      )}
    </BinderPage>
  );
}

function notFlown({ state, unanswered }: SortieListItem): string {
  if (state === "closed") return "cancelled";
  return unanswered > 0 ? `${unanswered} to accept` : "not flown";
}
