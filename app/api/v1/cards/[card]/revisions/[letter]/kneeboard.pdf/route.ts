import { requestCtx } from "@/lib/auth/request-ctx";
import { env } from "@/lib/env";
import { HttpRefusal } from "@/lib/http/http-refusal";
import { respond } from "@/lib/http/respond";
import { kneeboardCacheKey } from "@/lib/pdf/kneeboard/model";
import { sheetCodeUrl } from "@/lib/pdf/kneeboard/sheet-code";
import { RenderFailed, renderKneeboardOffThread } from "@/lib/pdf/render-worker/render-off-thread";
import { keptSheet } from "@/lib/storage/sheet-files";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { layOutSheet } from "@/lib/testcards/sheet";
import { getSheetSource } from "@/lib/workflow/card/queries";
import { PAPERS } from "@/lib/workflow/card/schema";
import { digestOf } from "@/lib/workflow/digest";

type Context = { params: Promise<{ card: string; letter: string }> };
type Source = ReturnType<typeof getSheetSource>;
type Paper = (typeof PAPERS)[number];

/** GET …/revisions/{letter}/kneeboard.pdf?paper=a5: the sheet as it stands now, marked across the page unless released. */
export function GET(request: Request, { params }: Context) {
  return respond(async () => {
    const { db, actor } = await requestCtx(request);
    const { card, letter } = await params;
    const asked = new URL(request.url).searchParams.get("paper") ?? "a5";
    const paper = PAPERS.find((known) => known === asked);
    if (!paper) throw new HttpRefusal(400, "Malformed", `paper is one of ${PAPERS.join(", ")}.`);
    const source = getSheetSource(db, actor, card, letter);
    const pdf = await drawnSheet(source, paper);
    return new Response(Buffer.from(pdf), {
      headers: {
        "Content-Type": "application/pdf",
        "Content-Disposition": `inline; filename="card-${source.card.number}-rev-${letter}-${source.state.replaceAll(" ", "-")}.pdf"`,
        "Cache-Control": "no-store",
      },
    });
  });
}

/** Drawn once for one document, state, paper and address of the scan page. */
async function drawnSheet({ card, state, digest, document, stamp, updatedAt }: Source, paper: Paper): Promise<Uint8Array> {
  const codeUrl = stamp ? sheetCodeUrl(env().NEXTAUTH_URL ?? "", stamp.code) : null;
  const { aircraft } = document.programme;
  const key = `${kneeboardCacheKey({ digest, state, paper })}.${digestOf(codeUrl).slice(0, 8)}`;
  try {
    return await keptSheet(key, () =>
      renderKneeboardOffThread({
        pages: layOutSheet(document, { paper, state, widths: B612_WIDTHS, stamp }),
        title: `Card ${card.number} rev ${document.identity.letter}, ${document.content.title}`,
        subject: `${aircraft.type} ${aircraft.registration}, ${state}`,
        codeUrl,
        recordedAt: stamp?.at ?? updatedAt,
      }),
    );
  } catch (error) {
    if (error instanceof RenderFailed) throw new HttpRefusal(503, "Not drawn", error.message);
    throw error;
  }
}
