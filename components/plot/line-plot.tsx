import { type Span, scaleAround, ticks } from "@/components/gauge/geometry";
import { Cell, HeadCell, Row, Table, TableHead } from "@/components/ui/table";
import { formatNumber, ownDecimals } from "@/lib/format/number";
import { withUnit } from "@/lib/format/unit";
import type { Unit } from "@/lib/testcards/units";

export type PlotAxis = { name: string; unit: Unit };
export type PlotPoint = { x: number; y: number };
export type PlotLimit = { value: number; label: string; layer: "placard" | "card" | "abort" };
export type PlotCallout = { x: number; y: number; label: string };

const WIDTH = 640;
const HEIGHT = 260;
const LEFT = 48;
const RIGHT = 12;
const TOP = 16;
const BOTTOM = 44;

const spanX = (values: number[]): Span => {
  const low = Math.min(...values);
  const high = Math.max(...values);
  return { low, high: high > low ? high : low + 1 };
};

/** One quantity along another: the limit's label stands on its line, and words and figures stand behind the picture. */
export function LinePlot(props: {
  title: string;
  summary: string;
  x: PlotAxis;
  y: PlotAxis;
  points: PlotPoint[];
  limits?: PlotLimit[];
  callout?: PlotCallout;
}) {
  const { title, summary, x, y, points } = props;
  if (points.length === 0) return <p className="text-ink-soft">{title}: no readings to draw.</p>;
  return (
    <figure className="flex flex-col gap-2">
      <figcaption>
        <span className="block font-bold text-lg">{title}</span>
        <span className="block text-ink-soft">{summary}</span>
      </figcaption>
      <Drawing {...props} />
      <details>
        <summary className="link min-h-11 content-center">Figures behind this plot</summary>
        <Table label={`${title}, figures`} className="max-w-sm">
          <TableHead>
            <HeadCell figures>{withUnit(`${x.name},`, x.unit)}</HeadCell>
            <HeadCell figures>{withUnit(`${y.name},`, y.unit)}</HeadCell>
          </TableHead>
          <tbody>
            {points.map((point) => (
              <Row key={point.x}>
                <Cell figures>{formatNumber(point.x, ownDecimals(point.x))}</Cell>
                <Cell figures>{formatNumber(point.y, ownDecimals(point.y))}</Cell>
              </Row>
            ))}
          </tbody>
        </Table>
      </details>
    </figure>
  );
}

function Drawing({ title, summary, x, y, points, limits = [], callout }: Parameters<typeof LinePlot>[0]) {
  const xScale = spanX(points.map((point) => point.x));
  const yScale = scaleAround([...points.map((point) => point.y), ...limits.map((limit) => limit.value)]);
  const atX = (value: number) => LEFT + ((value - xScale.low) / (xScale.high - xScale.low)) * (WIDTH - LEFT - RIGHT);
  const atY = (value: number) => HEIGHT - BOTTOM - ((value - yScale.low) / (yScale.high - yScale.low)) * (HEIGHT - TOP - BOTTOM);
  const line = points.map((point) => `${atX(point.x).toFixed(1)},${atY(point.y).toFixed(1)}`).join(" ");
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} role="img" aria-label={`${title}. ${summary}`} className="h-auto w-full max-w-3xl">
      {ticks(yScale, 7).map((value) => (
        <g key={value}>
          <line x1={LEFT} x2={WIDTH - RIGHT} y1={atY(value)} y2={atY(value)} strokeWidth="1" className="stroke-rule" />
          <text x={LEFT - 8} y={atY(value) + 4} textAnchor="end" className="plot-text">
            {formatNumber(value, ownDecimals(value))}
          </text>
        </g>
      ))}
      {ticks(xScale, 8).map((value) => (
        <text key={value} x={atX(value)} y={HEIGHT - BOTTOM + 20} textAnchor="middle" className="plot-text">
          {formatNumber(value, ownDecimals(value))}
        </text>
      ))}
      <text x={WIDTH - RIGHT} y={HEIGHT - 6} textAnchor="end" className="plot-text">
        {withUnit(`${x.name},`, x.unit)}
      </text>
      <text x="0" y="10" className="plot-text">
        {withUnit(`${y.name},`, y.unit)}
      </text>
      {limits.map((limit) => (
        <g key={`${limit.layer}${limit.value}`}>
          <line
            x1={LEFT}
            x2={WIDTH - RIGHT}
            y1={atY(limit.value)}
            y2={atY(limit.value)}
            strokeWidth={limit.layer === "placard" ? 3 : 1.5}
            strokeDasharray={limit.layer === "abort" ? "6 4" : undefined}
            className={limit.layer === "placard" ? "stroke-arc-red" : "stroke-ink"}
          />
          <text
            x={WIDTH - RIGHT}
            y={atY(limit.value) - 6}
            textAnchor="end"
            className={limit.layer === "placard" ? "plot-text fill-ink-red" : "plot-text fill-ink"}
          >
            {limit.label}
          </text>
        </g>
      ))}
      <polyline points={line} fill="none" strokeWidth="2" className="stroke-ink" />
      {points.map((point) => (
        <circle key={point.x} cx={atX(point.x)} cy={atY(point.y)} r="3.5" className="fill-ink" />
      ))}
      {callout ? (
        <g>
          <path d={`M${atX(callout.x)} ${atY(callout.y) - 8}l6 8l-6 8l-6 -8Z`} className="fill-arc-yellow stroke-sheet" />
          <text x={atX(callout.x) + 12} y={atY(callout.y) - 10} className="plot-text fill-ink">
            {callout.label}
          </text>
        </g>
      ) : null}
    </svg>
  );
}
