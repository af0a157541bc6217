import { join } from "node:path";
import { renderToBuffer } from "@react-pdf/renderer";
import { createElement } from "react";
import { projectFolder } from "@/lib/pdf/project-folder";
import { KneeboardDocument } from "./document";
import type { KneeboardModel } from "./model";
import type { CodeModules } from "./paint-page";
import { codeMatrix } from "./sheet-code";

function modulesOf(url: string): CodeModules {
  const matrix = codeMatrix(url);
  return { size: matrix.length, dark: (row, column) => matrix[row]?.[column] === true };
}

/** Draws a laid-out sheet as a PDF with the typeface embedded. No clock and no network. */
export async function renderKneeboard(model: KneeboardModel): Promise<Uint8Array> {
  const folder = join(projectFolder(), "fonts");
  const fonts = { regular: join(folder, "b612-latin-400-normal.woff"), bold: join(folder, "b612-latin-700-normal.woff") };
  const code = model.codeUrl === null ? null : modulesOf(model.codeUrl);
  const element = createElement(KneeboardDocument, { model, fonts, code });
  return new Uint8Array(await renderToBuffer(element as Parameters<typeof renderToBuffer>[0]));
}
