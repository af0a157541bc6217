import { beforeEach, describe, expect, test, vi } from "vitest";
import { SignInNeeded } from "@/lib/auth/errors";
import type { Role } from "@/lib/testcards/words";
import { findingKey } from "@/lib/workflow/card/policy";
import { type Desk, newDesk } from "../support/new-desk";
import { answersFor, cardInReview, debriefOf, draftCard, plannedSortie, readyContent, sortieInput } from "../support/stories";

// The session is the only thing faked: each call says in which role it is made.
const held = vi.hoisted(() => ({ ctx: undefined as unknown, db: undefined as unknown }));
vi.mock("@/lib/auth/request-ctx", () => ({
  requestCtx: async () => {
    if (!held.ctx) throw new SignInNeeded();
    return held.ctx;
  },
}));
vi.mock("@/db/client", () => ({ getDb: () => held.db }));

let desk: Desk;
beforeEach(() => {
  desk = newDesk();
  held.db = desk.db;
  held.ctx = undefined;
});

type Handler = (request: Request, context: { params: Promise<never> }) => Promise<Response>;
type Sent = { as?: Role | null; body?: unknown; raw?: string; headers?: Record<string, string>; method?: string; query?: string };

async function call(
  handler: unknown,
  params: Record<string, string>,
  { as = "engineer", body, raw, headers = {}, method = "POST", query = "" }: Sent = {},
) {
  held.ctx = as === null ? undefined : desk.as(as);
  const text = raw ?? (body === undefined ? undefined : JSON.stringify(body));
  const request = new Request(`http://127.0.0.1:3000/api/v1/x${query}`, {
    method: text === undefined && method === "POST" ? "GET" : method,
    ...(text === undefined ? {} : { body: text }),
    headers: { ...(text === undefined ? {} : { "content-type": "application/json" }), ...headers },
  });
  const response = await (handler as Handler)(request, { params: Promise.resolve(params as never) });
  const type = response.headers.get("content-type") ?? "";
  return {
    status: response.status,
    type,
    headers: response.headers,
    json: type.includes("json") ? await response.clone().json() : null,
    response,
  };
}

const cardsRoute = await import("@/app/api/v1/programmes/[programme]/cards/route");
const cardRoute = await import("@/app/api/v1/cards/[card]/route");
const meRoute = await import("@/app/api/v1/me/route");

describe("every answer", () => {
  test("to nobody is 401 as problem+json, and no cache keeps it", async () => {
    const { status, type, json, headers } = await call(meRoute.GET, {}, { as: null });
    expect([status, type, headers.get("cache-control")]).toEqual([401, "application/problem+json", "no-store"]);
    expect(json).toMatchObject({ type: "about:blank", title: "Not signed in", status: 401 });
  });

  test("names who is signed in, without a secret", async () => {
    const { json } = await call(meRoute.GET, {}, { as: "pilot" });
    expect(json).toEqual({
      id: desk.people.pilot.id,
      name: "The pilot",
      email: `${desk.people.pilot.id}@harrowfen.example`,
      roles: ["pilot"],
      residualRisk: "Medium",
      team: { id: desk.teamId, name: "Harrow Fen Aeroworks" },
    });
  });

  test.each([
    ["403 for another role", { as: "pilot" as Role, body: { title: "A card", kind: "flight" } }, 403],
    ["400 for what is not JSON", { raw: "{title" }, 400],
    ["400 for a list", { raw: "[]" }, 400],
    ["415 for another type", { raw: "title=x", headers: { "content-type": "application/x-www-form-urlencoded" } }, 415],
    ["413 for a megabyte too many", { raw: JSON.stringify({ title: "x".repeat(1_000_001) }) }, 413],
    ["422 for missing input", { body: {} }, 422],
    ["422 for a kind that is none", { body: { title: "A card", kind: "joyride" } }, 422],
    ["400 for a key too short", { body: { title: "A card", kind: "flight" }, headers: { "idempotency-key": "1" } }, 400],
  ])("is %s, and nothing is written", async (_, sent, status) => {
    const before = desk.db.$client.serialize();
    const answer = await call(cardsRoute.POST, { programme: desk.programmeId }, sent);
    expect([answer.status, answer.type]).toEqual([status, "application/problem+json"]);
    expect(answer.json.status).toBe(status);
    expect(desk.db.$client.serialize().equals(before)).toBe(true);
  });

  test("refuses unknown fields by name", async () => {
    const { status, json } = await call(
      cardsRoute.POST,
      { programme: desk.programmeId },
      { body: { title: "A card", kind: "flight", released: true } },
    );
    expect(status).toBe(422);
    expect(json.errors).toEqual([{ path: "released", message: "This field is not known here: take it out." }]);
  });

  test("says 404 for another team's programme as for one that never was", async () => {
    const input = { body: { title: "A card", kind: "flight" } };
    const [theirs, none] = [
      await call(cardsRoute.POST, { programme: desk.otherProgrammeId }, input),
      await call(cardsRoute.POST, { programme: desk.newId() }, input),
    ];
    expect(theirs.status).toBe(404);
    expect(theirs.json).toEqual(none.json);
  });
});

describe("cards", () => {
  test("are made once for one Idempotency-Key, and another body under it is 409", async () => {
    const headers = { "idempotency-key": "0197a000-0000-7000-8000-000000000001" };
    const make = (title: string) => call(cardsRoute.POST, { programme: desk.programmeId }, { body: { title, kind: "flight" }, headers });
    const [first, again, other] = [await make("Climb"), await make("Climb"), await make("Descent")];
    expect([first.status, again.status, other.status]).toEqual([201, 201, 409]);
    expect(again.json).toEqual(first.json);
    const { json } = await call(cardsRoute.GET, { programme: desk.programmeId });
    expect(json.items).toHaveLength(1);
  });

  test("are listed a page at a time", async () => {
    for (const title of ["One", "Two", "Three"])
      await call(cardsRoute.POST, { programme: desk.programmeId }, { body: { title, kind: "taxi" } });
    const page = async (query: string) => (await call(cardsRoute.GET, { programme: desk.programmeId }, { query })).json;
    const first = await page("?limit=2");
    expect(first.items.map(({ number }: { number: string }) => number)).toEqual(["01", "02"]);
    const second = await page(`?limit=2&after=${first.nextAfter}`);
    expect([second.items.length, second.nextAfter]).toEqual([1, null]);
    for (const query of ["?limit=0", "?limit=201", "?limit=x", "?after=nowhere"])
      expect((await call(cardsRoute.GET, { programme: desk.programmeId }, { query })).status).toBe(400);
  });

  test("save with If-Match: 428 without, 412 with the current version when stale", async () => {
    const { cardId, version } = draftCard(desk);
    const patch = (headers: Record<string, string>, remarks: string) =>
      call(cardRoute.PATCH, { card: cardId }, { method: "PATCH", body: { content: readyContent({ remarks }) }, headers });
    expect((await patch({}, "x")).status).toBe(428);
    expect((await patch({ "if-match": "3" }, "x")).status).toBe(400);
    const shown = await call(cardRoute.GET, { card: cardId });
    expect(shown.headers.get("etag")).toBe(`"${version}"`);
    const saved = await patch({ "if-match": shown.headers.get("etag") ?? "" }, "First.");
    expect([saved.status, saved.headers.get("etag")]).toEqual([200, `"${version + 1}"`]);
    const stale = await patch({ "if-match": `"${version}"` }, "Second.");
    expect([stale.status, stale.json.currentVersion]).toEqual([412, version + 1]);
    expect((await call(cardRoute.GET, { card: cardId })).json.content.remarks).toBe("First.");
  });

  test("name each refused figure by its path", async () => {
    const { cardId, version } = draftCard(desk);
    const raw = JSON.stringify({ content: { ...readyContent(), fuelOnBoardL: -1, remarks: "x".repeat(10_000) } }).replace(
      '"baggageKg":6',
      '"baggageKg":1e999',
    );
    const { status, json } = await call(
      cardRoute.PATCH,
      { card: cardId },
      { method: "PATCH", raw, headers: { "if-match": `"${version}"` } },
    );
    expect(status).toBe(422);
    expect(json.errors.map(({ path }: { path: string }) => path).sort()).toEqual([
      "content.baggageKg",
      "content.fuelOnBoardL",
      "content.remarks",
    ]);
  });

  test("go through review and release, and the wrong password signs nothing", async () => {
    const { hashPassword } = await import("@/lib/auth/password");
    const { users } = await import("@/db/schema");
    desk.db
      .update(users)
      .set({ passwordHash: await hashPassword("reviewer's own") })
      .run();
    const { cardId, version } = draftCard(desk);
    const submit = await import("@/app/api/v1/cards/[card]/submit/route");
    const sent = await call(
      submit.POST,
      { card: cardId },
      { body: { answers: answersFor(desk, cardId) }, headers: { "if-match": `"${version}"` } },
    );
    expect([sent.status, sent.json.state]).toEqual([200, "in review"]);
    const readiness = await import("@/app/api/v1/cards/[card]/readiness/route");
    const { json: ready } = await call(readiness.GET, { card: cardId }, { as: "reviewer" });
    for (const item of ready.items) expect(item.key).toBe(findingKey(item));
    const { POST } = await import("@/app/api/v1/cards/[card]/release/route");
    const sign = (password: string, as: Role = "reviewer") =>
      call(POST, { card: cardId }, { as, body: { password, digest: ready.digest } });
    const wrong = await sign("guess");
    expect([wrong.status, wrong.json.errors]).toEqual([
      422,
      [{ path: "password", message: "That is not your password. Nothing was signed; type it again." }],
    ]);
    expect((await sign("reviewer's own", "engineer")).status).toBe(403);
    const right = await sign("reviewer's own");
    expect([right.status, right.json.digest]).toEqual([200, ready.digest]);

    const document = await import("@/app/api/v1/cards/[card]/revisions/[letter]/document/route");
    const frozen = await call(document.GET, { card: cardId, letter: "A" }, { as: "observer" });
    const bytes = new Uint8Array(await crypto.subtle.digest("SHA-256", await frozen.response.arrayBuffer()));
    expect(Buffer.from(bytes).toString("hex")).toBe(right.json.digest);
    const sheets = await import("@/app/api/v1/sheets/[code]/route");
    expect((await call(sheets.GET, { code: right.json.code }, { as: null })).json).toEqual({
      standing: "in force",
      caution: "In force is not permission to fly.",
    });
  });

  test("have no signed document before release, and print as a POST that is recorded", async () => {
    const { cardId } = cardInReview(desk);
    const document = await import("@/app/api/v1/cards/[card]/revisions/[letter]/document/route");
    expect((await call(document.GET, { card: cardId, letter: "A" })).status).toBe(404);
    const { POST } = await import("@/app/api/v1/cards/[card]/revisions/[letter]/prints/route");
    const print = await call(POST, { card: cardId, letter: "A" }, { as: "observer", body: {} });
    expect([print.status, print.json.href]).toEqual([201, `/api/v1/cards/${cardId}/revisions/A/kneeboard.pdf?paper=a5`]);
    expect(desk.audit().at(-1)?.action).toBe("card.print");
    expect((await call(POST, { card: cardId, letter: "A" }, { body: { paper: "a0" } })).status).toBe(422);
  });
});

describe("a scanned sheet", () => {
  test("of no code is unknown, and a flood of look-ups from one address is stopped", async () => {
    const { GET } = await import("@/app/api/v1/sheets/[code]/route");
    const look = (address: string) => call(GET, { code: "00000-00000" }, { as: null, headers: { "x-forwarded-for": address } });
    expect((await look("192.0.2.1")).json.standing).toBe("unknown");
    for (let i = 0; i < 119; i += 1) await look("192.0.2.1");
    const stopped = await look("192.0.2.1");
    expect([stopped.status, Number(stopped.headers.get("retry-after")) > 0]).toEqual([429, true]);
    expect((await look("192.0.2.2")).status).toBe(200);
  });
});

describe("sorties", () => {
  test("are planned, accepted, briefed, debriefed once and judged through the interface", async () => {
    const { sortieId, revisionId, digest } = plannedSortie(desk);
    const acceptance = await import("@/app/api/v1/sorties/[sortie]/cards/[revision]/acceptance/route");
    const params = { sortie: sortieId, revision: revisionId };
    expect((await call(acceptance.POST, params, { as: "pilot", body: { digest: "0".repeat(64), answer: "accepted" } })).status).toBe(412);
    expect((await call(acceptance.POST, params, { as: "engineer", body: { digest, answer: "accepted" } })).status).toBe(403);
    expect((await call(acceptance.POST, params, { as: "pilot", body: { digest, answer: "accepted" } })).status).toBe(200);

    const lines = await import("@/app/api/v1/sorties/[sortie]/go-no-go/route");
    const goNoGo = (await call(lines.GET, { sortie: sortieId }, { as: "pilot" })).json;
    const briefRoute = await import("@/app/api/v1/sorties/[sortie]/brief/route");
    const answers = Object.fromEntries(goNoGo.findings.map((finding: never) => [findingKey(finding), "Known."]));
    const no = await call(briefRoute.POST, { sortie: sortieId }, { as: "pilot", body: { goNoGo: [], answers } });
    expect([no.status, no.json.open]).toEqual([409, goNoGo.lines]);
    const ticked = goNoGo.lines.map((line: string) => ({ line, go: true }));
    expect((await call(briefRoute.POST, { sortie: sortieId }, { as: "pilot", body: { goNoGo: ticked, answers } })).json.state).toBe(
      "briefed",
    );

    const submit = await import("@/app/api/v1/sorties/[sortie]/debrief/submit/route");
    const body = { id: desk.newId(), content: debriefOf(desk, sortieId, { climb: {} }) };
    const [first, again] = [
      await call(submit.POST, { sortie: sortieId }, { as: "pilot", body }),
      await call(submit.POST, { sortie: sortieId }, { as: "pilot", body }),
    ];
    expect([first.status, again.status]).toEqual([201, 201]);
    expect(again.json).toEqual(first.json);
    const other = await call(
      submit.POST,
      { sortie: sortieId },
      { as: "pilot", body: { ...body, content: { ...body.content, comment: "More." } } },
    );
    expect(other.status).toBe(409);

    const checks = await import("@/app/api/v1/sorties/[sortie]/checks/route");
    const report = (await call(checks.GET, { sortie: sortieId }, { as: "observer" })).json;
    expect([report.version, report.reports.length, report.flownUnbriefed]).toEqual([1, 1, false]);
    expect((await call(checks.GET, { sortie: sortieId }, { query: "?version=2" })).status).toBe(404);
    expect((await call(checks.GET, { sortie: sortieId }, { query: "?version=NaN" })).status).toBe(400);
  });

  test("answer impossible entries with every field at once", async () => {
    const { sortieId } = plannedSortie(desk);
    const content = debriefOf(desk, sortieId, { climb: {} });
    content.times.takeOff = "09:21";
    content.times.landing = "09:04";
    for (const entry of content.points[0]?.readings ?? []) if (entry.reading.includes("oil-t")) entry.value = 860;
    const submit = await import("@/app/api/v1/sorties/[sortie]/debrief/submit/route");
    const { status, json } = await call(submit.POST, { sortie: sortieId }, { as: "pilot", body: { id: desk.newId(), content } });
    expect(status).toBe(422);
    expect(json.errors.map(({ path }: { path: string }) => path)).toEqual(
      expect.arrayContaining(["times.landing", expect.stringContaining("oil-t")]),
    );
  });

  test("change only what is sent, on the version that was seen", async () => {
    const { sortieId } = plannedSortie(desk);
    const route = await import("@/app/api/v1/sorties/[sortie]/route");
    const shown = await call(route.GET, { sortie: sortieId });
    const patch = (etag: string) =>
      call(route.PATCH, { sortie: sortieId }, { method: "PATCH", body: { plannedOn: "2031-05-06" }, headers: { "if-match": etag } });
    expect((await patch(shown.headers.get("etag") ?? "")).status).toBe(200);
    expect((await patch(shown.headers.get("etag") ?? "")).status).toBe(412);
    const after = (await call(route.GET, { sortie: sortieId })).json;
    expect([after.plannedOn, after.crew.length, after.cards.length]).toEqual(["2031-05-06", 2, 1]);
  });

  test("are planned by POST on the programme, and squawks raised and read", async () => {
    const { revisionId } = plannedSortie(desk);
    const route = await import("@/app/api/v1/programmes/[programme]/sorties/route");
    const { programmeId: _programme, ...body } = sortieInput(desk, [revisionId]);
    const made = await call(route.POST, { programme: desk.programmeId }, { body });
    expect([made.status, made.json.number]).toEqual([201, 2]);
    const squawks = await import("@/app/api/v1/programmes/[programme]/squawks/route");
    const raised = await call(
      squawks.POST,
      { programme: desk.programmeId },
      { as: "pilot", body: { system: "Fuel", text: "<b>weep</b> 🛢", severity: "monitor" } },
    );
    expect(raised.status).toBe(201);
    const one = await import("@/app/api/v1/squawks/[squawk]/route");
    expect((await call(one.GET, { squawk: raised.json.id }, { as: "observer" })).json).toMatchObject({
      text: "<b>weep</b> 🛢",
      state: "open",
      raisedByName: "The pilot",
    });
  });

  test("squawks go from state to state by POST on their transitions, each by the role whose step it is", async () => {
    const squawks = await import("@/app/api/v1/programmes/[programme]/squawks/route");
    const { POST } = await import("@/app/api/v1/squawks/[squawk]/transitions/route");
    const raised = await call(
      squawks.POST,
      { programme: desk.programmeId },
      { as: "pilot", body: { system: "Fuel", text: "weep", severity: "monitor" } },
    );
    const go = (as: Role, body: object) => call(POST, { squawk: raised.json.id }, { as, body });
    expect((await go("engineer", { to: "flown" })).json.errors).toEqual([
      { path: "to", message: "Say where to: assessed, dispositioned, verified or closed." },
    ]);
    expect((await go("engineer", { to: "dispositioned" })).status).toBe(422);
    expect((await go("mechanic", { to: "closed" })).status).toBe(403);
    expect((await go("mechanic", { to: "verified" })).status).toBe(409);
    expect((await go("engineer", { to: "assessed", from: "open", severity: "monitor" })).json.state).toBe("assessed");
    expect((await go("engineer", { to: "assessed", from: "open", severity: "monitor" })).status).toBe(412);
    const work = { to: "dispositioned", disposition: "rectified", why: "union tightened", entryReference: "log 2, page 14" };
    expect((await go("engineer", work)).status).toBe(403);
    expect((await go("mechanic", { ...work, disposition: "accepted as is" })).status).toBe(403);
    expect((await go("mechanic", work)).json).toMatchObject({ state: "dispositioned", disposition: "rectified" });
    expect((await go("mechanic", { to: "verified" })).json.state).toBe("verified");
    expect((await go("engineer", { to: "closed" })).json.state).toBe("closed");
  });

  test("are cancelled with the version that was seen and a reason, and not closed before a debrief", async () => {
    const { sortieId } = plannedSortie(desk);
    const { POST: cancel } = await import("@/app/api/v1/sorties/[sortie]/cancel/route");
    const { POST: close } = await import("@/app/api/v1/sorties/[sortie]/close/route");
    const sortie = { sortie: sortieId };
    expect((await call(close, sortie, { body: {} })).status).toBe(409);
    expect((await call(cancel, sortie, { body: { why: "wind" } })).status).toBe(428);
    expect((await call(cancel, sortie, { body: { why: "wind" }, headers: { "if-match": '"9"' } })).status).toBe(412);
    const empty = await call(cancel, sortie, { body: { why: " " }, headers: { "if-match": '"1"' } });
    expect(empty.json.errors).toEqual([{ path: "why", message: "Say in one line why it is cancelled." }]);
    const done = await call(cancel, sortie, { body: { why: "wind" }, headers: { "if-match": '"1"' } });
    expect([done.status, done.json.state, done.headers.get("etag")]).toEqual([200, "closed", '"2"']);
  });
});
