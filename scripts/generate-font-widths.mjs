/** Writes lib/testcards/b612-widths.ts: the advance widths of the shipped B612 files, so that the core can break lines without a font engine. */
import { writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import * as fontkit from "fontkit";

const path = (name) => fileURLToPath(new URL(`../${name}`, import.meta.url));

function advances(file) {
  const font = fontkit.openSync(path(file));
  const printable = font.characterSet.filter((code) => code >= 0x20 && code !== 0xad && code < 0xfff0).sort((a, b) => a - b);
  const perMille = (code) => Math.round((font.glyphForCodePoint(code).advanceWidth * 1000) / font.unitsPerEm);
  return {
    widths: printable.map((code) => [code, perMille(code)]),
    missing: Math.round((font.getGlyph(0).advanceWidth * 1000) / font.unitsPerEm),
  };
}

function table(name, { widths }) {
  const rows = [];
  for (let at = 0; at < widths.length; at += 12) {
    rows.push(
      `    ${widths
        .slice(at, at + 12)
        .map(([code, width]) => `${code}: ${width}`)
        .join(", ")},`,
    );
  }
  return `  // biome-ignore format: a generated table\n  ${name}: {\n${rows.join("\n")}\n  },`;
}

const regular = advances("fonts/b612-latin-400-normal.woff");
const bold = advances("fonts/b612-latin-700-normal.woff");
writeFileSync(
  path("lib/testcards/b612-widths.ts"),
  `/** Advance widths of B612 in 1/1000 of the type size. Written by scripts/generate-font-widths.mjs from fonts/; do not edit. */
import type { FontWidths } from "./sheet-types";

export const B612_WIDTHS: FontWidths = {
  missing: ${Math.max(regular.missing, bold.missing)},
${table("regular", regular)}
${table("bold", bold)}
};
`,
);
