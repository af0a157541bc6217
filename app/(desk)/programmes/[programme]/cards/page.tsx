import { Plus } from "lucide-react";
import Link from "next/link";
import { CardState } from "@/components/card/card-state";
import { buttonClass } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHeader } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay } from "@/lib/format/time";
import { countOf } from "@/lib/format/words";
import { CARD_STATES } from "@/lib/testcards/words";
import { listCards } from "@/lib/workflow/card/queries";
import { may } from "@/lib/workflow/permissions";
import { BinderPage } from "../binder-page";

export const metadata = { title: "Cards" };

type Props = { params: Promise<{ programme: string }>; searchParams: Promise<{ state?: string }> };

/** The programme's cards: newest revision, its state, and which letter is in force. */
export default async function CardsPage({ params, searchParams }: Props) {
  const { programme } = await params;
  const { state } = await searchParams;
  const { db, actor } = await requestCtx();
  const all = listCards(db, actor, programme);
  const cards = state ? all.filter((card) => card.state === state) : all;
  const here = `/programmes/${programme}/cards`;
  const newCard = may(actor, "write cards") ? (
    <Link href={`${here}/new`} className={buttonClass("main")}>
      <Plus aria-hidden className="size-5" /> New card
    </Link>
  ) : null;
  return (
    <BinderPage>
      <PageHeader title="Cards" lead="Test points put together for one sitting, reviewed and released as one sheet." actions={newCard} />
      <nav aria-label="State" className="mb-4 flex flex-wrap gap-x-4 gap-y-1">
        {[undefined, ...CARD_STATES].map((one) => (
          <Link
            key={one ?? "all"}
            href={one ? `${here}?state=${encodeURIComponent(one)}` : here}
            aria-current={state === one ? "page" : undefined}
            className="flex min-h-11 items-center underline-offset-8 hover:underline aria-[current]:font-bold aria-[current]:underline"
          >
            {one ?? "all"} ({one ? all.filter((card) => card.state === one).length : all.length})
          </Link>
        ))}
      </nav>
      {cards.length === 0 ? (
        <EmptyState
          title={state ? `No card is ${state}.` : "No cards yet."}
          action={
            state ? (
              <Link className="underline underline-offset-4" href={here}>
                Show all cards
              </Link>
            ) : (
              newCard
            )
          }
        >
          {state ? null : "A card starts empty; test points are dragged on to it from the shelf."}
        </EmptyState>
      ) : (
        <Table label="Cards">
          <TableHead>
            <HeadCell>Card</HeadCell>
            <HeadCell>Newest revision</HeadCell>
            <HeadCell>In force</HeadCell>
            <HeadCell figures className="max-hand:hidden">
              Points
            </HeadCell>
            <HeadCell className="max-hand:hidden">Planned</HeadCell>
            <HeadCell className="max-hand:hidden">Author</HeadCell>
          </TableHead>
          <tbody>
            {cards.map((card) => (
              <Row key={card.id}>
                <RowHead>
                  <Link href={`${here}/${card.id}`} className="inline-block min-h-6 font-bold underline-offset-4 hover:underline">
                    Card {card.number} {card.title}
                  </Link>
                </RowHead>
                <Cell>
                  <CardState state={card.state} letter={card.letter} />
                </Cell>
                <Cell>
                  {card.inForce ? (
                    <Link className="underline underline-offset-4" href={`${here}/${card.id}?rev=${card.inForce.letter}`}>
                      rev {card.inForce.letter}
                    </Link>
                  ) : (
                    <span className="text-ink-soft">none</span>
                  )}
                </Cell>
                <Cell figures className="max-hand:hidden">
                  {card.points}
                </Cell>
                <Cell className="whitespace-nowrap max-hand:hidden">
                  {card.plannedOn ? formatDay(card.plannedOn) : <span className="text-ink-soft">not set</span>}
                </Cell>
                <Cell className="max-hand:hidden">{card.authorName}</Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      )}
      <p className="mt-3 text-ink-soft text-sm">{countOf(cards.length, "card")}</p>
    </BinderPage>
  );
}
