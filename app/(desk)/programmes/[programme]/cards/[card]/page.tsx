import Link from "next/link";
import { cache } from "react";
import { CardBuilder } from "@/components/builder/card-builder";
import { differencesFromShelf } from "@/components/builder/shelf-difference";
import { CardRecord, type CardRecordView } from "@/components/card/card-record";
import { CardState } from "@/components/card/card-state";
import { requestCtx } from "@/lib/auth/request-ctx";
import { env } from "@/lib/env";
import { codeMatrix, sheetCodeUrl } from "@/lib/pdf/kneeboard/sheet-code";
import type { CardPoint } from "@/lib/testcards/card";
import { type CardView, getCardRevision } from "@/lib/workflow/card/queries";
import { listTestPoints } from "@/lib/workflow/programme/queries";
import { orNotFound } from "../../../../or-not-found";

type Props = { params: Promise<{ programme: string; card: string }>; searchParams: Promise<{ rev?: string }> };

export async function generateMetadata({ params, searchParams }: Props) {
  const view = await viewOf((await params).card, (await searchParams).rev);
  return { title: `Card ${view.card.number} ${view.document.content.title}` };
}

/** Read once a request, for the title and the page. */
const viewOf = cache(async (card: string, rev: string | undefined) => {
  const { db, actor, today } = await requestCtx();
  return orNotFound(() => getCardRevision(db, actor, card, { today, ...(rev ? { letter: rev } : {}) }));
});

/** Only what the record shows goes to the browser. */
function toRecord(shelf: CardPoint[], { card, revision, document, digest, findings, comments, stamp, may }: CardView): CardRecordView {
  const { id, letter, state, version, answers, submittedAt, endedWhy, endedAt } = revision;
  const authorName = document.identity.author.name;
  const differences = document.content.points.flatMap((point) => {
    const parts = differencesFromShelf(
      point,
      shelf.find(({ template }) => template?.code === point.template?.code),
    ).map(({ label }) => label);
    return parts.length > 0 ? [{ point: point.id, parts }] : [];
  });
  return {
    card: { id: card.id, number: card.number },
    revision: { id, letter, state, version, answers, authorName, submittedAt, endedWhy, endedAt },
    document,
    digest,
    findings,
    comments,
    differences,
    stamp,
    code: stamp ? codeMatrix(sheetCodeUrl(env().NEXTAUTH_URL ?? "", stamp.code)) : null,
    may,
  };
}

/** A draft is built here; anything else is read, reviewed and printed here. */
export default async function CardPage({ params, searchParams }: Props) {
  const { programme } = await params;
  const { db, actor } = await requestCtx();
  const view = await viewOf((await params).card, (await searchParams).rev);
  const { document, revision } = view;
  const shelf = listTestPoints(db, actor, programme).map(({ content }) => content);
  const { widths: _widths, ...context } = view.context;
  return (
    <main className="grow bg-paper">
      {view.may.edit ? (
        <CardBuilder
          key={revision.id}
          identity={document.identity}
          version={revision.version}
          content={document.content}
          programme={view.programme}
          context={context}
          shelf={shelf}
          answers={revision.answers}
          comments={view.comments}
          beside={<Standing view={view} />}
        />
      ) : (
        <>
          <header className="flex flex-wrap items-center gap-x-4 gap-y-2 px-4 py-2">
            <h1 className="font-bold text-xl">
              Card {view.card.number} <span className="ms-2">{document.content.title}</span>
            </h1>
            <Standing view={view} />
          </header>
          <CardRecord key={revision.id} view={toRecord(shelf, view)} />
        </>
      )}
    </main>
  );
}

/** State, and the other revisions. */
function Standing({ view }: { view: CardView }) {
  const { revision } = view;
  return (
    <>
      <CardState state={revision.state} letter={revision.letter} />
      {view.revisions.length > 1 ? (
        <nav aria-label="Revisions" className="flex gap-1">
          {view.revisions.toReversed().map(({ id, letter, state }) => (
            <Link
              key={id}
              href={`?rev=${letter}`}
              aria-current={id === revision.id ? "page" : undefined}
              title={`Rev ${letter}, ${state}`}
              className="flex size-11 items-center justify-center underline underline-offset-4 aria-[current]:font-bold aria-[current]:no-underline"
            >
              {letter}
            </Link>
          ))}
        </nav>
      ) : null}
    </>
  );
}
