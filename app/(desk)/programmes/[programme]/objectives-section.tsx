import Link from "next/link";
import { Badge } from "@/components/ui/badge";
import { Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { countOf } from "@/lib/format/words";
import type { listObjectives, TestPoint } from "@/lib/workflow/programme/queries";

export function ObjectivesSection({
  objectives,
  points,
  programmeId,
}: {
  objectives: ReturnType<typeof listObjectives>;
  points: TestPoint[];
  programmeId: string;
}) {
  const open = objectives.filter(({ code }) => !points.some((point) => point.content.objectives.includes(code)));
  return (
    <Section
      id="objectives"
      title="Objectives"
      aside={open.length === 0 ? "Every objective has its test points" : `${countOf(open.length, "objective")} without a test point`}
    >
      <Table label="Objectives">
        <TableHead>
          <HeadCell>Objective</HeadCell>
          <HeadCell>Shown when</HeadCell>
          <HeadCell>Priority</HeadCell>
          <HeadCell>Test points</HeadCell>
        </TableHead>
        <tbody>
          {objectives.map(({ code, question, success, priority, requirement }) => (
            <Row key={code}>
              <RowHead className="min-w-60">
                <span className="font-bold">{code}</span> {question}
                {requirement ? <span className="block text-ink-soft text-sm">{requirement}</span> : null}
              </RowHead>
              <Cell className="min-w-60">{success}</Cell>
              <Cell>
                <Badge>{priority}</Badge>
              </Cell>
              <Cell className="min-w-40">
                <PointLinks points={points.filter((point) => point.content.objectives.includes(code))} programmeId={programmeId} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </Section>
  );
}

function PointLinks({ points, programmeId }: { points: TestPoint[]; programmeId: string }) {
  if (points.length === 0) return <span className="text-ink-soft">none yet</span>;
  return (
    <span className="flex flex-wrap gap-x-3">
      {points.map(({ code, title }) => (
        <Link key={code} href={`/programmes/${programmeId}/test-points/${code}`} title={title} className="link py-1">
          {code}
        </Link>
      ))}
    </span>
  );
}
