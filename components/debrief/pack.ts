import type { CardDocument } from "@/lib/testcards/card";
import type { CheckContext } from "@/lib/testcards/debrief-types";
import type { SortieKind, SortieState } from "@/lib/testcards/words";

/** What the phone fetches once for a sortie: its cards in order, and who may debrief it. */
export type DebriefPack = {
  sortie: {
    id: string;
    number: number;
    kind: SortieKind;
    state: SortieState;
    plannedOn: string;
    programmeId: string;
    configurationId: string | null;
  };
  cards: { revisionId: string; digest: string | null; document: CardDocument }[];
  submitted: { id: string; submittedAt: string; by: string } | null;
  me: { id: string; name: string };
  mayDebrief: boolean;
};

/** The check as the phone can make it: on the frozen card alone, before any amendment or recalibration. */
export function phoneContext({ sortie }: DebriefPack): CheckContext {
  return {
    flownOn: sortie.plannedOn,
    configurationId: sortie.configurationId,
    stationPressureAltitudeFt: null,
    calibrations: null,
    amendments: [],
    dispositions: [],
    groundingOpen: false,
  };
}
