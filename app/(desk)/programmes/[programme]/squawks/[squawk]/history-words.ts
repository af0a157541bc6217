import { asSentences, sentenceCase } from "@/lib/format/words";
import type { SquawkEvent } from "@/lib/workflow/squawk/history";

/** One step of a squawk's life as a reader says it. */
export function historyWords({ action, before, after }: SquawkEvent): string {
  switch (action) {
    case "squawk.raise":
      return asSentences([after.raisedFrom === "exceedance" ? "Raised by the check of readings" : "Raised", `Severity: ${after.severity}`]);
    case "squawk.assess":
      return asSentences([
        before.severity === after.severity
          ? `Assessed: ${after.severity} confirmed`
          : `Assessed: ${after.severity}, was ${before.severity}`,
        ...said(after.assessedWhy),
      ]);
    case "squawk.rectify":
    case "squawk.accept":
      return asSentences([
        sentenceCase(after.disposition ?? ""),
        ...said(after.dispositionWhy),
        ...said(after.dispositionLimit, "Limit"),
        ...said(after.entryReference, "Entry"),
      ]);
    case "squawk.verify":
      return asSentences(["Verified", ...said(after.verifiedReference, "Entry")]);
    case "squawk.close":
      return "Closed.";
    default:
      return action;
  }
}

const said = (text: string | null | undefined, term?: string): string[] => (text ? [term ? `${term}: ${text}` : text] : []);
