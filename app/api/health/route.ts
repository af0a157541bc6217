import { currentHealth } from "@/lib/health/current-health";

export const dynamic = "force-dynamic";

/** GET /api/health: process, database, disk, schema version. No sign-in. */
export async function GET() {
  const health = await currentHealth();
  return Response.json(health, { status: health.status === "ok" ? 200 : 503, headers: { "Cache-Control": "no-store" } });
}
