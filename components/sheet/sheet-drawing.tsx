import type { SheetItem } from "@/lib/testcards/sheet-types";

/** The modules of a QR, row by row, true where dark. */
export type CodeMatrix = boolean[][];

const MM_PER_PT = 25.4 / 72;
const INK = "#000";
const PAPER = "#fff";
const OUTLINE_PT = 0.5; // as in the PDF

function Lettering({ item }: { item: Extract<SheetItem, { kind: "text" }> }) {
  const outlined = item.role === "watermark";
  const paint = outlined ? { fill: "none", stroke: INK, strokeWidth: OUTLINE_PT * MM_PER_PT } : { fill: item.reversed ? PAPER : INK };
  const turn = item.turnDeg ? { transform: `rotate(${item.turnDeg} ${item.xMm} ${item.baselineMm})` } : {};
  return (
    <text
      x={item.xMm}
      y={item.baselineMm}
      fontSize={item.sizePt * MM_PER_PT}
      fontWeight={item.weight === "bold" ? 700 : 400}
      textAnchor={item.anchor}
      style={{ whiteSpace: "pre" }}
      {...paint}
      {...turn}
    >
      {item.text}
    </text>
  );
}

function Code({ item, code }: { item: Extract<SheetItem, { kind: "code" }>; code: CodeMatrix | null }) {
  const { xMm, yMm, sizeMm } = item;
  if (code === null) {
    return (
      <>
        <rect x={xMm} y={yMm} width={sizeMm} height={sizeMm} fill="none" stroke={INK} strokeWidth={0.2} />
        {["no", "code:", "draft"].map((word, row) => (
          <text
            key={word}
            x={xMm + sizeMm / 2}
            y={yMm + sizeMm / 2 + 1.05 + (row - 1) * 3}
            fontSize={8 * MM_PER_PT}
            textAnchor="middle"
            fill={INK}
          >
            {word}
          </text>
        ))}
      </>
    );
  }
  const side = sizeMm / code.length;
  const dark = code.flatMap((cells, row) => cells.map((on, column) => (on ? `M${column} ${row}h1v1h-1z` : "")));
  return <path d={dark.join("")} transform={`translate(${xMm} ${yMm}) scale(${side})`} fill={INK} shapeRendering="crispEdges" />;
}

function Drawn({ item, code }: { item: SheetItem; code: CodeMatrix | null }) {
  switch (item.kind) {
    case "text":
      return <Lettering item={item} />;
    case "code":
      return <Code item={item} code={code} />;
    case "line":
      return <line x1={item.x1Mm} y1={item.y1Mm} x2={item.x2Mm} y2={item.y2Mm} stroke={INK} strokeWidth={item.strokeMm} />;
    case "circle":
      return <circle cx={item.xMm} cy={item.yMm} r={item.radiusMm} fill="none" stroke={INK} strokeWidth={item.strokeMm} />;
    default: {
      const filled = item.kind === "rect" && item.filled;
      const stroke = item.strokeMm > 0 ? { stroke: INK, strokeWidth: item.strokeMm } : {};
      return <rect x={item.xMm} y={item.yMm} width={item.widthMm} height={item.heightMm} fill={filled ? INK : "none"} {...stroke} />;
    }
  }
}

/** The items of a page in their order, inside an SVG whose units are millimetres. */
export function SheetDrawing({ items, code }: { items: readonly SheetItem[]; code: CodeMatrix | null }) {
  return items.map((item, index) => (
    // biome-ignore lint/suspicious/noArrayIndexKey: items have no other name, and a page is drawn whole
    <Drawn key={index} item={item} code={code} />
  ));
}
