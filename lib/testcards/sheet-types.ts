/** What `layOutSheet` answers: pages of drawn items in millimetres from the top left, the same for screen and PDF. */
export type FontWeight = "regular" | "bold";
export type SheetPaper = "a5" | "half-letter";

/** Advance widths of B612 in 1/1000 of the type size, by code point; a generated table. */
export type FontWidths = { regular: Record<number, number>; bold: Record<number, number>; missing: number };

export type SheetItem =
  | {
      kind: "text";
      xMm: number;
      baselineMm: number;
      text: string;
      sizePt: number;
      weight: FontWeight;
      anchor: "start" | "middle" | "end";
      reversed: boolean;
      role: SheetRole;
      turnDeg?: number;
    } // turned about its anchor, clockwise; role "watermark" is outlined, not filled
  | { kind: "rect"; xMm: number; yMm: number; widthMm: number; heightMm: number; strokeMm: number; filled: boolean; role: SheetRole }
  | { kind: "line"; x1Mm: number; y1Mm: number; x2Mm: number; y2Mm: number; strokeMm: number; role: SheetRole }
  | { kind: "circle"; xMm: number; yMm: number; radiusMm: number; strokeMm: number; role: SheetRole }
  | {
      kind: "cell";
      xMm: number;
      yMm: number;
      widthMm: number;
      heightMm: number;
      strokeMm: number;
      role: "cell";
      reading: string | null;
      row: number;
    }
  | { kind: "code"; xMm: number; yMm: number; sizeMm: number; role: "footer" }; // the QR: drawn by the renderer

export type SheetRole =
  | "header"
  | "limits"
  | "abort"
  | "then"
  | "point"
  | "entry"
  | "step"
  | "recovery"
  | "grid"
  | "cell"
  | "outcome"
  | "cover"
  | "footer"
  | "watermark";

/** Where one point stands on one page: for dragging on screen and for tests. */
export type SheetRegion = { point: string; part: number; parts: number; xMm: number; yMm: number; widthMm: number; heightMm: number };

export type SheetPage = {
  kind: "cover" | "points";
  number: number;
  of: number;
  widthMm: number;
  heightMm: number;
  items: SheetItem[];
  regions: SheetRegion[];
  usedMm: number; // of roomMm, for the builder's "how full"
  roomMm: number;
};

/** What cannot be laid out without cutting; the sheet must not be released with any. */
export type SheetOverflow = { point: string | null; page: number | null; message: string };

/** The release stamp's words; null while nothing is signed. */
export type SheetStamp = { name: string; role: string; at: string; shortDigest: string; code: string };
