import { Facts, Section } from "@/components/ui/page-header";
import { Cell, HeadCell, Row, RowHead, Table, TableHead } from "@/components/ui/table";
import { formatNumber } from "@/lib/format/number";
import { formatQuantity } from "@/lib/format/unit";
import type { Aircraft } from "@/lib/testcards/card";
import type { Programme } from "@/lib/workflow/programme/queries";
import { EnvelopeDrawing } from "./envelope-drawing";

type Settings = Programme["settings"];

export function AircraftSection({
  aircraft,
  airfield,
  fuelPlan,
}: {
  aircraft: Aircraft;
  airfield: Settings["airfield"];
  fuelPlan: Settings["fuelPlan"];
}) {
  const mass = (value: number) => formatQuantity({ value, unit: "kg" });
  const litres = (value: number) => formatQuantity({ value, unit: "L" });
  return (
    <Section id="aircraft" title="Aircraft" aside={`${aircraft.type}, ${aircraft.registration}`}>
      <div className="grid gap-x-12 gap-y-8 desk:grid-cols-2">
        <div className="flex flex-col gap-6">
          <Facts
            columns={1}
            items={[
              { term: "Greatest mass", value: mass(aircraft.maxMassKg) },
              { term: "Empty", value: `${mass(aircraft.emptyMassKg)} at ${formatNumber(aircraft.emptyArmM, 3)} m` },
              { term: "Fuel", value: `${litres(aircraft.fuelCapacityL)}, unusable ${litres(aircraft.fuelUnusableL)}` },
              { term: "Fuel density", value: `${formatNumber(aircraft.fuelDensityKgPerL, 2)} kg/L` },
              {
                term: "Critical altitude",
                value: aircraft.criticalAltitudeFt === null ? "none" : formatQuantity({ value: aircraft.criticalAltitudeFt, unit: "ft" }),
              },
              { term: "Flown from", value: `${airfield.name}, ${formatQuantity({ value: airfield.elevationFt, unit: "ft" })}` },
              { term: "Fuel plan", value: `taxi ${litres(fuelPlan.taxiL)}, return ${litres(fuelPlan.returnL)}` },
              { term: "Reserve", value: litres(fuelPlan.reserveL) },
            ]}
          />
          <Table label="Stations">
            <TableHead>
              <HeadCell>Station</HeadCell>
              <HeadCell figures>Arm, m</HeadCell>
              <HeadCell figures>At most</HeadCell>
            </TableHead>
            <tbody>
              {[
                ...aircraft.stations,
                { name: "Fuel", armM: aircraft.fuelArmM, maxKg: aircraft.fuelCapacityL * aircraft.fuelDensityKgPerL },
              ].map(({ name, armM, maxKg }) => (
                <Row key={name}>
                  <RowHead>{name}</RowHead>
                  <Cell figures>{formatNumber(armM, 3)}</Cell>
                  <Cell figures>{mass(maxKg)}</Cell>
                </Row>
              ))}
            </tbody>
          </Table>
        </div>
        <div className="flex flex-col gap-6">
          <EnvelopeDrawing aircraft={aircraft} />
          <Table label="Speeds">
            <TableHead>
              <HeadCell>Speed</HeadCell>
              <HeadCell>What it is</HeadCell>
              <HeadCell figures>Value</HeadCell>
            </TableHead>
            <tbody>
              {aircraft.speeds.map(({ code, name, valueKt, airspeed }) => (
                <Row key={code}>
                  <RowHead>
                    <SpeedCode code={code} />
                  </RowHead>
                  <Cell>{name}</Cell>
                  <Cell figures>
                    {formatNumber(valueKt)} <span className="text-ink-soft">{airspeed}</span>
                  </Cell>
                </Row>
              ))}
            </tbody>
          </Table>
        </div>
      </div>
    </Section>
  );
}

/** V with its index set low, as the trade writes it. */
function SpeedCode({ code }: { code: string }) {
  const [letter = code, index] = code.split("_");
  return (
    <span className="whitespace-nowrap font-bold">
      {letter}
      {index ? <sub className="text-[0.8em]">{index}</sub> : null}
    </span>
  );
}
