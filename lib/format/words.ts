/** First letter up, for the start of a line or a chip; the word itself is unchanged in data. */
export function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** "1 sortie", "2 sorties", "no sorties". */
export function countOf(count: number, one: string, many = `${one}s`): string {
  return count === 0 ? `no ${many}` : `${count} ${count === 1 ? one : many}`;
}

const and = new Intl.ListFormat("en", { type: "conjunction" });
const or = new Intl.ListFormat("en", { type: "disjunction" });

export const listAnd = (items: readonly string[]) => and.format(items);
export const listOr = (items: readonly string[]) => or.format(items);

/** Reasons in a row as sentences: each begins with a capital and ends with a stop. */
export function asSentences(parts: readonly string[]): string {
  return parts.map((part) => `${sentenceCase(part)}${/[.!?]$/.test(part) ? "" : "."}`).join(" ");
}
