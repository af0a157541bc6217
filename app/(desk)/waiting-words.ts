import { formatDay } from "@/lib/format/time";
import { countOf, sentenceCase } from "@/lib/format/words";
import type { WaitingItem } from "@/lib/workflow/sortie/flight-line";

export type WaitingLine = { key: string; head: string; text: string; address: string };

/** What to do, on what, and where it is done. */
export function waitingLine(item: WaitingItem): WaitingLine {
  const base = `/programmes/${item.programmeId}`;
  switch (item.what) {
    case "review card":
    case "returned card":
    case "draft card": {
      const head = { "review card": "Review", "returned card": "Answer the review of", "draft card": "Go on with" }[item.what];
      return {
        key: `${item.what}${item.cardId}`,
        head: `${head} card ${item.number} rev ${item.letter}`,
        text: item.title,
        address: `${base}/cards/${item.cardId}`,
      };
    }
    case "answer cards":
    case "brief sortie":
    case "review results":
    case "close sortie": {
      const head = {
        "answer cards": "Accept or decline the cards of",
        "brief sortie": "Brief",
        "review results": "Review the results of",
        "close sortie": "Close",
      }[item.what];
      const cards = item.what === "answer cards" ? `, ${countOf(item.unanswered, "card")} unanswered` : "";
      return {
        key: `${item.what}${item.sortieId}`,
        head: `${head} sortie ${item.number}`,
        text: `${item.kind}, ${formatDay(item.plannedOn)}${cards}`,
        address: `${base}/sorties/${item.sortieId}${item.what === "close sortie" ? "/results" : ""}`,
      };
    }
    case "debrief sortie":
      return {
        key: `debrief${item.sortieId}`,
        head: `Debrief sortie ${item.number}`,
        text: `${item.kind}, ${formatDay(item.plannedOn)}`,
        address: `/debrief/${item.sortieId}`,
      };
    case "countersign step":
      return {
        key: item.stepId,
        head: `Countersign “${item.decision}”`,
        text: item.step,
        address: `${base}/sorties/${item.sortieId}/results#steps`,
      };
    case "sign configuration":
      return {
        key: item.configurationId,
        head: `Sign configuration ${item.number}`,
        text: "It is current and nobody has signed it.",
        address: `${base}#configuration`,
      };
    case "open squawk":
      return {
        key: item.squawkId,
        head: `${item.act ? `${sentenceCase(item.act)} squawk` : "Squawk"} ${item.number}, ${item.severity}`,
        text: item.act ? item.text : `${item.text.replace(/\.$/, "")}. ${item.by}`,
        address: `${base}/squawks/${item.squawkId}`,
      };
  }
}
