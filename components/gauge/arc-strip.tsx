import { classNames } from "@/components/ui/class-names";
import { layOutStrip, type Strip, type StripLayout } from "./strip-layout";

const PHONE_LENGTH = 320;
const PAD = 10;
const TRACK_TOP = 34;
const TRACK = 9;

/**
 * A straight gauge with the markings of 14 CFR 23.1549: green for normal, yellow for caution, a red radial at the placard.
 * Open triangle: reading on the gauge. Filled triangle: true. Diamond: hot day. A bar through a mark is its U.
 */
export function ArcStrip({
  title,
  strip,
  length = PHONE_LENGTH,
  className = "max-w-[22rem]",
}: {
  title: string;
  strip: Strip;
  length?: number;
  className?: string;
}) {
  const layout = layOutStrip(strip, length);
  const summary = [...strip.marks.map((mark) => mark.label), ...strip.limits.map((limit) => limit.label)].join(", ");
  const height = TRACK_TOP + TRACK + (strip.marks.length > 0 ? 38 : 8);
  return (
    <svg
      viewBox={`${-PAD} 0 ${length + 2 * PAD} ${height}`}
      role="img"
      aria-label={`${title}: ${summary}`}
      className={classNames("block h-auto w-full overflow-visible", className)}
    >
      <rect x="0" y={TRACK_TOP} width={length} height={TRACK} className="fill-wash-grey" />
      {layout.zones.map((zone) => (
        <rect
          key={`${zone.tone}${zone.from}`}
          x={zone.from}
          y={TRACK_TOP}
          width={Math.max(0, zone.to - zone.from)}
          height={TRACK}
          className={zone.tone === "green" ? "fill-arc-green" : "fill-arc-yellow"}
        />
      ))}
      {layout.radials.map((radial) => (
        <Radial key={`${radial.layer}${radial.side}${radial.at}`} radial={radial} />
      ))}
      {layout.marks.map((mark) => (
        <Mark key={mark.kind} mark={mark} />
      ))}
    </svg>
  );
}

function Radial({ radial: { layer, at, label, labelAt } }: { radial: StripLayout["radials"][number] }) {
  const red = layer === "placard";
  return (
    <g>
      <line
        x1={at}
        x2={at}
        y1={TRACK_TOP - (red ? 8 : 4)}
        y2={TRACK_TOP + TRACK + (red ? 8 : 4)}
        strokeWidth={red ? 4 : 2}
        strokeDasharray={layer === "abort" ? "3 2" : undefined}
        className={red ? "stroke-arc-red" : "stroke-ink"}
      />
      <text x={labelAt} y={TRACK_TOP - 13} textAnchor="middle" className={classNames("plot-text", red ? "fill-ink-red" : "fill-ink")}>
        {label}
      </text>
    </g>
  );
}

const MID = TRACK_TOP + TRACK / 2;
const LABEL_BASE = TRACK_TOP + TRACK + 30;

function Mark({ mark: { kind, at, bar, label, labelAt, beyond } }: { mark: StripLayout["marks"][number] }) {
  const below = kind === "hot day";
  const barY = below ? TRACK_TOP + TRACK + 8 : MID;
  return (
    <g>
      {bar ? <line x1={bar.from} x2={bar.to} y1={barY} y2={barY} strokeWidth="2" className="stroke-ink" /> : null}
      {kind === "reading" ? (
        <path d={`M${at - 6} ${TRACK_TOP - 11}H${at + 6}L${at} ${TRACK_TOP - 1}Z`} strokeWidth="2" className="fill-sheet stroke-ink" />
      ) : null}
      {kind === "true" ? <path d={`M${at - 6} ${TRACK_TOP - 11}H${at + 6}L${at} ${TRACK_TOP - 1}Z`} className="fill-ink" /> : null}
      {below ? <path d={`M${at} ${barY - 7}L${at + 6} ${barY}L${at} ${barY + 7}L${at - 6} ${barY}Z`} className="fill-ink" /> : null}
      <text x={labelAt} y={LABEL_BASE} textAnchor="middle" className={classNames("plot-text", below && "fill-ink font-bold")}>
        {label}
        {beyond ? ", off the scale" : ""}
      </text>
    </g>
  );
}
