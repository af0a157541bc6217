import { create } from "qrcode";

/** What the code on a sheet's foot says: the page that tells whether this print is in force. */
export function sheetCodeUrl(origin: string, code: string): string {
  return `${origin}/c/${code}`;
}

/** The code's modules by row, true where dark; the same for screen and PDF. */
export function codeMatrix(url: string): boolean[][] {
  const { modules } = create(url, { errorCorrectionLevel: "L" });
  return Array.from({ length: modules.size }, (_, row) =>
    Array.from({ length: modules.size }, (_cell, column) => modules.get(row, column) === 1),
  );
}
