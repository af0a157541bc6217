import { Badge, type BadgeTone } from "@/components/ui/badge";
import type { SortieState } from "@/lib/testcards/words";

const TONE: Record<SortieState, BadgeTone> = { planned: "blue", briefed: "green", flown: "yellow", debriefed: "yellow", closed: "plain" };

export function SortieStateBadge({ state }: { state: SortieState }) {
  return <Badge tone={TONE[state]}>{state}</Badge>;
}
