import { Canvas, Document, Page } from "@react-pdf/renderer";
import type { KneeboardModel } from "./model";
import { type CodeModules, type FontFiles, type Painter, PT_PER_MM, paintPage } from "./paint-page";

/** The laid-out pages on paper: each is painted from its items, for the core has already decided where everything stands. */
export function KneeboardDocument({ model, fonts, code }: { model: KneeboardModel; fonts: FontFiles; code: CodeModules | null }) {
  const { title, subject, pages } = model;
  const at = new Date(model.recordedAt);
  return (
    <Document
      title={title}
      subject={subject}
      creator="Greenarc"
      producer="Greenarc"
      creationDate={at}
      modificationDate={at}
      language="en-GB"
    >
      {pages.map((page) => {
        const size = { width: page.widthMm * PT_PER_MM, height: page.heightMm * PT_PER_MM };
        return (
          <Page key={page.number} size={size} wrap={false}>
            <Canvas
              style={size}
              paint={(painter) => {
                paintPage(painter as unknown as Painter, fonts, page, code);
                return null;
              }}
            />
          </Page>
        );
      })}
    </Document>
  );
}
