import type { Metadata } from "next";
import { Badge } from "@/components/ui/badge";
import { PageHeader, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { requestCtx } from "@/lib/auth/request-ctx";
import { formatDay } from "@/lib/format/time";
import { sentenceCase } from "@/lib/format/words";
import { ROLES } from "@/lib/testcards/words";
import { MAY, type Permission } from "@/lib/workflow/permissions";
import { getTeam, listPeople } from "@/lib/workflow/team/queries";

export const metadata: Metadata = { title: "Team" };

export default async function TeamPage() {
  const { db, actor } = await requestCtx();
  const team = getTeam(db, actor);
  const people = listPeople(db, actor);
  return (
    <main className="mx-auto w-full max-w-6xl grow px-4 py-8 desk:px-6">
      <PageHeader title={team.name} lead="Who works here, in which roles, and what each role may do. Nobody releases a card they wrote." />
      <Section id="people" title="People">
        <Table label="People">
          <TableHead>
            <HeadCell>Name</HeadCell>
            <HeadCell>Roles</HeadCell>
            <HeadCell>Residual risk a reviewer may accept</HeadCell>
          </TableHead>
          <tbody>
            {people.map(({ id, name, email, roles, residualRisk, removedAt }) => (
              <Row key={id}>
                <RowHead>
                  <span className="font-bold">{name}</span>
                  {id === actor.id ? <span className="text-ink-soft">, you</span> : null}
                  <span className="block break-all text-ink-soft text-sm">{email}</span>
                </RowHead>
                <Cell>
                  <span className="flex flex-wrap gap-1.5">
                    {removedAt ? <Badge>left {formatDay(removedAt)}</Badge> : roles.map((role) => <Badge key={role}>{role}</Badge>)}
                  </span>
                </Cell>
                <Cell>{roles.includes("reviewer") ? `up to ${residualRisk}` : "—"}</Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      </Section>
      <Section id="may" title="Who may what">
        <Table label="Who may what">
          <TableHead>
            <HeadCell>To</HeadCell>
            {ROLES.map((role) => (
              <HeadCell key={role} className="text-center">
                {role}
              </HeadCell>
            ))}
          </TableHead>
          <tbody>
            {(Object.keys(MAY) as Permission[]).map((permission) => (
              <Row key={permission}>
                <RowHead>{sentenceCase(permission)}</RowHead>
                {ROLES.map((role) => (
                  <Cell key={role} className="text-center">
                    {(MAY[permission] as readonly string[]).includes(role) ? (
                      "yes"
                    ) : (
                      <span className="text-ink-soft">
                        ·<span className="sr-only">no</span>
                      </span>
                    )}
                  </Cell>
                ))}
              </Row>
            ))}
          </tbody>
        </Table>
      </Section>
    </main>
  );
}
