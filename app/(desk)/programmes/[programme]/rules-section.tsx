import { Facts, Section } from "@/components/ui/page-header";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { formatOnGauge, formatQuantity } from "@/lib/format/unit";
import type { AbortLine, Instrument } from "@/lib/testcards/card";
import type { Programme } from "@/lib/workflow/programme/queries";

export function RulesSection({
  settings,
  hotDayBasis,
  instruments,
}: {
  settings: Programme["settings"];
  hotDayBasis: Programme["hotDayBasis"];
  instruments: Instrument[];
}) {
  return (
    <Section id="rules" title="Rules of the programme">
      <Facts
        items={[
          { term: "Hot-day basis", value: hotDayBasis ?? "not set: nothing can be released" },
          { term: "Reaction time", value: formatQuantity({ value: settings.reactionMin * 60, unit: "s" }) },
          {
            term: "Density altitude at most",
            value: settings.daMaximumFt === null ? "not set" : formatQuantity({ value: settings.daMaximumFt, unit: "ft" }),
          },
          { term: "Before an engine stop", value: settings.coolDown?.text ?? "nothing timed" },
        ]}
      />
      <div className="grid gap-x-12 gap-y-6 pt-6 desk:grid-cols-2">
        <List title="Go or no-go: any no stops" items={settings.goNoGo} />
        <div>
          <h3 className="pb-1 font-bold">Call words</h3>
          <Facts columns={1} items={settings.callWords.map(({ word, meaning }) => ({ term: word, value: meaning }))} />
        </div>
        <List title="Then, in the air, in this order" items={settings.thenActions.air} ordered />
        <List title="Then, on the ground, in this order" items={settings.thenActions.ground} ordered />
        <List title="Standing aborts, on the gauge" items={settings.standingAborts.map((line) => abortWords(line, instruments))} />
      </div>
    </Section>
  );
}

export function abortWords(line: AbortLine, instruments: Instrument[]): string {
  if (line.kind === "event") return line.text;
  const instrument = instruments.find(({ id }) => id === line.instrument);
  const figure = instrument ? formatOnGauge(line.onGauge, instrument) : formatNumber(line.onGauge, ownDecimals(line.onGauge));
  const window = line.perMinute && line.windowS !== null ? ` in ${formatNumber(line.windowS)} s` : "";
  const when = line.appliesWhen === "always" ? "" : `, ${line.appliesWhen}`;
  return `${instrument?.gaugeName ?? line.parameter}${line.side === "min" ? " below" : ""} ${figure}${window}${when}`;
}

function List({ title, items, ordered = false }: { title: string; items: string[]; ordered?: boolean }) {
  const Tag = ordered ? "ol" : "ul";
  return (
    <div>
      <h3 className="pb-1 font-bold">{title}</h3>
      <Tag className={ordered ? "list-decimal ps-6" : "list-disc ps-5"}>
        {items.map((item) => (
          <li key={item} className="py-0.5">
            {item}
          </li>
        ))}
      </Tag>
    </div>
  );
}
