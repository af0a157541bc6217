const BROWSERS: [RegExp, string][] = [
  [/Edg\//, "Edge"],
  [/Firefox\//, "Firefox"],
  [/OPR\//, "Opera"],
  [/Chrome\//, "Chrome"],
  [/Safari\//, "Safari"],
];
const SYSTEMS: [RegExp, string][] = [
  [/iPhone|iPad/, "iOS"],
  [/Android/, "Android"],
  [/Windows/, "Windows"],
  [/Macintosh/, "macOS"],
  [/Linux/, "Linux"],
];

/** A browser's own long name in two words; an unknown one is quoted as it came. */
export function deviceWords(userAgent: string): string {
  const found = (table: [RegExp, string][]) => table.find(([pattern]) => pattern.test(userAgent))?.[1];
  const browser = found(BROWSERS);
  const system = found(SYSTEMS);
  if (browser) return system ? `${browser} on ${system}` : browser;
  return userAgent.slice(0, 60) || "an unnamed device";
}
