import type { Page } from "@playwright/test";

export type Answer = { status: number; body: Record<string, unknown> & { detail?: string; errors?: { path: string; message: string }[] } };
type Sent = { ifMatch?: number; key?: string; headers?: Record<string, string>; text?: string };

/** /api/v1 with the session of a page, as a script of the team would call it: the origin is named, nothing else is added. */
export function apiOf(page: Page, url: string) {
  async function send(method: string, path: string, body?: unknown, { ifMatch, key, headers = {}, text }: Sent = {}): Promise<Answer> {
    const data = text ?? (body === undefined ? undefined : JSON.stringify(body));
    const response = await page.request.fetch(`${url}/api/v1${path}`, {
      method,
      headers: {
        Origin: url,
        ...(data === undefined ? {} : { "Content-Type": "application/json" }),
        ...(ifMatch === undefined ? {} : { "If-Match": `"${ifMatch}"` }),
        ...(key === undefined ? {} : { "Idempotency-Key": key }),
        ...headers,
      },
      ...(data === undefined ? {} : { data }),
    });
    const answer = await response.text();
    return { status: response.status(), body: answer.startsWith("{") ? JSON.parse(answer) : { text: answer } };
  }
  return {
    get: (path: string) => send("GET", path),
    post: (path: string, body: unknown, sent?: Sent) => send("POST", path, body, sent),
    patch: (path: string, body: unknown, sent?: Sent) => send("PATCH", path, body, sent),
    send,
  };
}

export type Api = ReturnType<typeof apiOf>;
type Listed = { id: string; number: string | number; title: string; kind: string; state: string; inForce: { revisionId: string } | null };

async function items(api: Api, path: string): Promise<Listed[]> {
  const { body } = await api.get(path);
  return (body.items ?? []) as Listed[];
}

/** The demo team has one programme. */
export async function programmeOf(api: Api): Promise<string> {
  const [programme] = await items(api, "/programmes");
  if (!programme) throw new Error("This person sees no programme.");
  return programme.id;
}

export async function cardNumbered(api: Api, number: string): Promise<Listed & { address: string }> {
  const programme = await programmeOf(api);
  const card = (await items(api, `/programmes/${programme}/cards`)).find((one) => one.number === number);
  if (!card) throw new Error(`There is no card ${number}.`);
  return { ...card, address: `/programmes/${programme}/cards/${card.id}` };
}

export async function sortiesOf(api: Api): Promise<{ id: string; number: number; kind: string; state: string; address: string }[]> {
  const programme = await programmeOf(api);
  const sorties = await items(api, `/programmes/${programme}/sorties`);
  return sorties.map(({ id, number, kind, state }) => ({
    id,
    number: Number(number),
    kind,
    state,
    address: `/programmes/${programme}/sorties/${id}`,
  }));
}
