/** Joins what is truthy; later classes win only by the style sheet's own order, so parts here never contradict each other. */
export function classNames(...parts: (string | false | null | undefined)[]): string {
  return parts.filter(Boolean).join(" ");
}
