import { Ban, Eye, Wrench } from "lucide-react";
import { Badge } from "@/components/ui/badge";
import type { SquawkSeverity } from "@/lib/testcards/words";

const ICON = { grounding: Ban, "before next test": Wrench, monitor: Eye } as const;
const TONE = { grounding: "red", "before next test": "yellow", monitor: "plain" } as const;

/** Sign, word, colour; what is over loses its colour. */
export function SeverityMark({ severity, ended = false }: { severity: SquawkSeverity; ended?: boolean }) {
  const Icon = ICON[severity];
  return (
    <Badge tone={ended ? "plain" : TONE[severity]}>
      <Icon aria-hidden="true" className="size-4" />
      {severity}
    </Badge>
  );
}
