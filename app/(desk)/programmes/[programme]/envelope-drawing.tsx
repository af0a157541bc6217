import { scaleAround, ticks } from "@/components/gauge/geometry";
import { formatNumber } from "@/lib/format/number";
import type { Aircraft } from "@/lib/testcards/card";

const WIDTH = 420;
const HEIGHT = 300;
const LEFT = 52;
const BOTTOM = 44;
const TOP = 24;
const RIGHT = 16;

/** Mass against centre of gravity, with its corners as the flight manual gives them. */
export function EnvelopeDrawing({ aircraft }: { aircraft: Aircraft }) {
  const { envelope, emptyMassKg, emptyArmM } = aircraft;
  const cg = scaleAround([...envelope.map((corner) => corner.cgM), emptyArmM], 0.1);
  const mass = scaleAround([...envelope.map((corner) => corner.massKg), emptyMassKg], 0.08);
  const x = (cgM: number) => LEFT + ((cgM - cg.low) / (cg.high - cg.low)) * (WIDTH - LEFT - RIGHT);
  const y = (massKg: number) => HEIGHT - BOTTOM - ((massKg - mass.low) / (mass.high - mass.low)) * (HEIGHT - BOTTOM - TOP);
  const corners = envelope.map(({ massKg, cgM }) => `${x(cgM).toFixed(1)},${y(massKg).toFixed(1)}`).join(" ");
  const words = envelope.map(({ massKg, cgM }) => `${formatNumber(massKg)} kg at ${formatNumber(cgM, 3)} m`).join(", ");
  return (
    <figure>
      <svg
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        role="img"
        aria-label={`Mass and CG envelope, corners ${words}`}
        className="h-auto w-full max-w-lg"
      >
        {ticks(mass, 6).map((value) => (
          <g key={value}>
            <line x1={LEFT} x2={WIDTH - RIGHT} y1={y(value)} y2={y(value)} strokeWidth="1" className="stroke-rule" />
            <text x={LEFT - 8} y={y(value) + 4} textAnchor="end" className="plot-text">
              {formatNumber(value)}
            </text>
          </g>
        ))}
        {ticks(cg, 5).map((value) => (
          <g key={value}>
            <line x1={x(value)} x2={x(value)} y1={TOP} y2={HEIGHT - BOTTOM} strokeWidth="1" className="stroke-rule" />
            <text x={x(value)} y={HEIGHT - BOTTOM + 19} textAnchor="middle" className="plot-text">
              {formatNumber(value, 2)}
            </text>
          </g>
        ))}
        <polygon points={corners} strokeWidth="2" className="fill-wash-green stroke-ink" />
        <path d={`M${x(emptyArmM) - 5} ${y(emptyMassKg)}h10m-5 -5v10`} strokeWidth="2" className="stroke-ink" />
        <text x={x(emptyArmM)} y={y(emptyMassKg) + 20} textAnchor="middle" className="plot-text">
          empty
        </text>
        <text x="0" y="12" className="plot-text">
          mass, kg
        </text>
        <text x={WIDTH - RIGHT} y={HEIGHT - 6} textAnchor="end" className="plot-text">
          CG, m aft of datum
        </text>
      </svg>
    </figure>
  );
}
