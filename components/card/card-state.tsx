import { Badge, type BadgeTone } from "@/components/ui/badge";
import type { CardState as State } from "@/lib/testcards/words";

const TONE: Record<State, BadgeTone> = { draft: "blue", "in review": "yellow", released: "green", superseded: "plain", withdrawn: "red" };

export function CardState({ state, letter }: { state: State; letter: string }) {
  return (
    <Badge tone={TONE[state]}>
      {state}, rev {letter}
    </Badge>
  );
}
