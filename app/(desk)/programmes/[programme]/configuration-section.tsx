import { Badge } from "@/components/ui/badge";
import { EmptyState } from "@/components/ui/empty-state";
import { Facts, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatNumber } from "@/lib/format/number";
import { formatDay, formatInstant } from "@/lib/format/time";
import type { Control } from "@/lib/testcards/card";
import type { ConfigurationListItem } from "@/lib/workflow/programme/queries";

export function ConfigurationSection({ configurations, controls }: { configurations: ConfigurationListItem[]; controls: Control[] }) {
  const current = configurations.find((configuration) => configuration.isCurrent);
  const earlier = configurations.filter((configuration) => !configuration.isCurrent);
  return (
    <Section id="configuration" title="Configuration" aside={current ? `${current.number} is the current one` : "none is current"}>
      {current ? (
        <Current configuration={current} />
      ) : (
        <EmptyState title="No configuration is current">What is fitted stands here, signed by a mechanic.</EmptyState>
      )}
      <div className="grid gap-x-12 gap-y-6 pt-6 desk:grid-cols-2">
        {controls.map((control) => (
          <ControlTable key={control.name} control={control} />
        ))}
        {earlier.length > 0 ? (
          <Table label="Earlier configurations">
            <TableHead>
              <HeadCell>Earlier</HeadCell>
              <HeadCell>What was fitted</HeadCell>
            </TableHead>
            <tbody>
              {earlier.map(({ id, number, fitted, signedByName, signedAt }) => (
                <Row key={id}>
                  <RowHead className="font-bold">{number}</RowHead>
                  <Cell>
                    {fitted}
                    <span className="block text-ink-soft text-sm">
                      {signedAt ? `signed by ${signedByName}, ${formatInstant(signedAt)}` : "never signed"}
                    </span>
                  </Cell>
                </Row>
              ))}
            </tbody>
          </Table>
        ) : null}
      </div>
    </Section>
  );
}

function Current({ configuration }: { configuration: ConfigurationListItem }) {
  const { number, fitted, details, massKg, armM, signedByName, signedAt, gapsMeasuredOn, disturbedOn } = configuration;
  const stale = disturbedOn !== null && (gapsMeasuredOn === null || gapsMeasuredOn < disturbedOn);
  return (
    <>
      <p className="flex flex-wrap items-center gap-3 pb-3">
        <span className="font-bold text-lg">
          {number} {fitted}
        </span>
        {signedAt ? <Badge tone="green">signed</Badge> : <Badge tone="red">not signed</Badge>}
      </p>
      <Facts
        items={[
          ...details.map(({ label, value }) => ({ term: label, value })),
          { term: "Mass and arm", value: `${formatNumber(massKg, 1)} kg at ${formatNumber(armM, 3)} m` },
          { term: "Signed by", value: signedAt ? `${signedByName}, ${formatInstant(signedAt)}` : "nobody yet: a mechanic signs it" },
          {
            term: "Exit gaps measured",
            value: `${gapsMeasuredOn ? formatDay(gapsMeasuredOn) : "never"}${stale ? ", before it was last disturbed: measure again" : ""}`,
          },
          { term: "Last disturbed", value: disturbedOn ? formatDay(disturbedOn) : "not since" },
        ]}
      />
    </>
  );
}

function ControlTable({ control: { name, positions, recoverTo } }: { control: Control }) {
  return (
    <Table label={`Positions of ${name}`}>
      <TableHead>
        <HeadCell>{name}</HeadCell>
        <HeadCell>Rule</HeadCell>
      </TableHead>
      <tbody>
        {positions.map((position) => {
          const rules = [
            position.name === recoverTo ? "a recovery starts with it" : "",
            position.maxSpeedKt === null ? "" : `not above ${formatNumber(position.maxSpeedKt)} kt`,
            position.groundOnly ? "on the ground only" : "",
            position.restricted ? "restricted in the air: needs a minimum height" : "",
          ].filter(Boolean);
          return (
            <Row key={position.name}>
              <RowHead className="font-bold">{position.name}</RowHead>
              <Cell>{rules.join(", ") || "no rule of its own"}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
