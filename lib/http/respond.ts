import { problemResponse, toProblem } from "./problem";

/** Runs a handler; an expected no becomes problem+json, anything else is logged and answered 500 without its inside. */
export async function respond(handle: () => Promise<Response> | Response): Promise<Response> {
  try {
    return await handle();
  } catch (error) {
    const problem = toProblem(error);
    if (problem) return problemResponse(problem);
    console.error(error);
    const detail = "Something went wrong here, and nothing was changed. Try again; if it happens again, tell whoever runs this server.";
    return problemResponse({ type: "about:blank", title: "Server error", status: 500, detail });
  }
}

/** JSON that no cache keeps: every answer depends on who asks and on what stands now. */
export function json(body: unknown, { status = 200, version }: { status?: number; version?: number } = {}): Response {
  const headers: Record<string, string> = { "Cache-Control": "no-store" };
  if (version !== undefined) headers.ETag = toETag(version);
  return Response.json(body, { status, headers });
}

export const toETag = (version: number) => `"${version}"`;
