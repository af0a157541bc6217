import { atPoint, type CardFacts, type Problem, type Rule } from "./rule";
import { figure } from "./say";

/** Of the sheet as laid out: smallest type by what is printed. NASA CR-177605's advice, in the team's own sizes. */
const SMALLEST = { step: 12, entry: 12, recovery: 12, limits: 14, abort: 14 } as const;

/** The heads over the two lists are labels, of label size. */
const IS_HEAD = /^(limits|abort|if reached|on the gauge(, if any:)?)$/i;

function typeTooSmall(facts: CardFacts): Problem[] {
  const smallest = new Map<keyof typeof SMALLEST, { sizePt: number; page: number }>();
  for (const page of facts.sheet?.pages ?? []) {
    for (const item of page.items) {
      if (item.kind !== "text" || !(item.role in SMALLEST) || IS_HEAD.test(item.text.trim())) continue;
      const role = item.role as keyof typeof SMALLEST;
      if (item.sizePt < SMALLEST[role] - 1e-6 && item.sizePt < (smallest.get(role)?.sizePt ?? Number.POSITIVE_INFINITY))
        smallest.set(role, { sizePt: item.sizePt, page: page.number });
    }
  }
  return [...smallest].map(([role, { sizePt, page }]) => ({
    message: `Page ${page}: ${role} type of ${figure(sizePt, 1)} pt is below ${SMALLEST[role]} pt. Enlarge it.`,
    where: { at: "card", field: "points" },
  }));
}

function overflow(facts: CardFacts): Problem[] {
  return (facts.sheet?.overflow ?? []).map(({ point, page, message }): Problem => {
    const at = facts.points.find((p) => p.point.id === point);
    const where = at ? atPoint(at) : ({ at: "card", field: "points" } as const);
    const place = [at?.name, page === null ? null : `page ${page}`].filter(Boolean).join(", ");
    return { message: `${place ? `${place}: ` : ""}${message}`, where };
  });
}

function missingBlocks(facts: CardFacts): Problem[] {
  const { thenLine, limits } = facts.programme;
  const places = new Set(facts.points.map(({ point }) => point.place));
  const then = (["air", "ground"] as const).flatMap((place): Problem[] => {
    if (!places.has(place) || thenLine[place].trim() !== "") return [];
    return [
      {
        message: `The THEN line for points ${place === "air" ? "in the air" : "on the ground"} is missing from the point pages. Write it, and it is repeated on every one.`,
        where: { at: "programme", field: "thenLine" },
      },
    ];
  });
  const table: Problem[] =
    facts.points.some(({ point }) => point.cardTable) && !limits.some((l) => l.layer === "card")
      ? [
          {
            message:
              "The limits are missing from the point pages: the programme has no card limit. Enter them, and they are repeated on every one.",
            where: { at: "programme", field: "limits" },
          },
        ]
      : [];
  return [...then, ...table, ...pagesLacking(facts)];
}

function pagesLacking({ sheet }: CardFacts): Problem[] {
  const pages = (sheet?.pages ?? []).filter((page) => page.kind === "points");
  return pages.flatMap((page): Problem[] => {
    const texts = page.items.filter((item) => item.kind === "text");
    const has = (role: string) => texts.some((item) => item.role === role);
    const numbered = texts.some((item) => new RegExp(`page\\s+${page.number}\\s+of\\s+${page.of}\\b`, "i").test(item.text));
    const missing = [
      has("limits") ? "" : "limits",
      has("abort") ? "" : "abort",
      has("then") ? "" : "THEN line",
      numbered ? "" : "page number",
    ].filter(Boolean);
    return missing.length === 0
      ? []
      : [
          {
            message: `Page ${page.number}: ${missing.join(", ")} missing. Repeat it on every point page.`,
            where: { at: "card", field: "points" },
          },
        ];
  });
}

export const sheetRules: Rule[] = [
  { number: "24a", code: "sheet-overflow", severity: "must", at: "card", card: overflow },
  { number: "24b", code: "block-not-repeated", severity: "must", at: "card", card: missingBlocks },
  { number: "25", code: "type-too-small", severity: "must", at: "card", card: typeTooSmall },
];
