import type { Metadata } from "next";
import { Badge } from "@/components/ui/badge";
import { Facts, PageHeader, Section } from "@/components/ui/page-header";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatInstant } from "@/lib/format/time";
import { listAnd } from "@/lib/format/words";
import { getTeam, listSessions } from "@/lib/workflow/team/queries";
import { endAllSessionsAction, endSessionAction } from "./actions";
import { deviceWords } from "./device-words";
import { EndAllSessions, EndSession } from "./end-sessions";

export const metadata: Metadata = { title: "Account" };

export default async function AccountPage() {
  const { db, actor, now } = await requestCtx();
  const sessions = listSessions(db, actor, now);
  return (
    <main className="mx-auto w-full max-w-3xl grow px-4 py-8 desk:px-6">
      <PageHeader title={actor.name} lead={actor.email} />
      <Section id="roles" title="In the team">
        <Facts
          items={[
            { term: "Team", value: getTeam(db, actor).name },
            { term: "Roles", value: listAnd(actor.roles) },
            ...(actor.roles.includes("reviewer") ? [{ term: "Residual risk you may accept", value: `up to ${actor.residualRisk}` }] : []),
          ]}
        />
      </Section>
      <Section
        id="sessions"
        title="Where you are signed in"
        lead="End a sign-in you do not know. Signing out everywhere ends this one too; a debrief kept on a phone stays on it."
      >
        <ul>
          {sessions.map(({ id, userAgent, createdAt, expiresAt, isThisOne }) => (
            <li key={id} className="flex flex-wrap items-center justify-between gap-4 border-rule border-b py-3">
              <div>
                <p className="flex flex-wrap items-center gap-2">
                  <span className="font-bold">{deviceWords(userAgent)}</span>
                  {isThisOne ? <Badge tone="blue">this one</Badge> : null}
                </p>
                <p className="text-ink-soft text-sm">
                  since {formatInstant(createdAt)}, until {formatInstant(expiresAt)}
                </p>
              </div>
              <EndSession action={endSessionAction} sessionId={id} label={isThisOne ? "Sign out here" : "End this sign-in"} />
            </li>
          ))}
        </ul>
        <div className="pt-6">
          <EndAllSessions action={endAllSessionsAction} />
        </div>
      </Section>
    </main>
  );
}
