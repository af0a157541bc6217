/** RFC 9457 problem as the interface answers it; `status` 0 means that no answer came. */
export type ApiProblem = {
  status: number;
  title: string;
  detail: string;
  errors: { path: string; message: string }[];
  [extra: string]: unknown;
};
export type ApiAnswer<Body> = { ok: true; status: number; body: Body; etag: string | null } | { ok: false; problem: ApiProblem };

type CallOptions = {
  method?: "GET" | "POST" | "PUT" | "PATCH";
  body?: unknown;
  ifMatch?: number;
  idempotencyKey?: string;
  signal?: AbortSignal;
};

/** One call of /api/v1. A lost connection is an answer too, so that nobody has to catch. */
export async function callApi<Body>(
  path: string,
  { method = "GET", body, ifMatch, idempotencyKey, signal }: CallOptions = {},
): Promise<ApiAnswer<Body>> {
  const headers: Record<string, string> = { Accept: "application/json" };
  if (body !== undefined) headers["Content-Type"] = "application/json";
  if (ifMatch !== undefined) headers["If-Match"] = `"${ifMatch}"`;
  if (idempotencyKey) headers["Idempotency-Key"] = idempotencyKey;
  let response: Response;
  try {
    response = await fetch(`/api/v1${path}`, {
      method,
      headers,
      body: body === undefined ? null : JSON.stringify(body),
      credentials: "same-origin",
      ...(signal ? { signal } : {}),
    });
  } catch {
    return { ok: false, problem: { status: 0, title: "No connection", detail: "The server did not answer.", errors: [] } };
  }
  const answer: unknown = response.status === 204 ? null : await response.json().catch(() => null);
  if (response.ok) return { ok: true, status: response.status, body: answer as Body, etag: response.headers.get("ETag") };
  const problem = (answer ?? {}) as Partial<ApiProblem>;
  return {
    ok: false,
    problem: {
      ...problem,
      status: response.status,
      title: problem.title ?? "Not done",
      detail: problem.detail ?? `The server answered ${response.status}.`,
      errors: problem.errors ?? [],
    },
  };
}
