import type { Quantity } from "../card";
import { withUnit } from "../unit-symbols";
import type { Unit } from "../units";

export { withUnit };

const MINUS = "−";

function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < 4; decimals++)
    if (Math.abs(step * 10 ** decimals - Math.round(step * 10 ** decimals)) < 1e-9) return decimals;
  return 4;
}

/** A number as it is spoken of: at most so many decimals, no idle zeros, a real minus sign. */
export function figure(value: number, decimals = 2): string {
  const text = value.toFixed(decimals);
  const trimmed = text.includes(".") ? text.replace(/\.?0+$/, "") : text;
  return (trimmed === "-0" ? "0" : trimmed).replace("-", MINUS);
}

/** A gauge number, to the decimals the gauge can show. */
export const onGaugeFigure = (value: number, readable: number): string => figure(value, Math.max(decimalsOf(readable), decimalsOf(value)));

/** A true value beside the limit it is compared with: one decimal, more where that would print the same figure twice. */
export function apart(value: number, from: number): string {
  for (let decimals = 1; decimals < 6; decimals++) {
    const text = figure(value, decimals);
    if (text !== figure(from, decimals)) return text;
  }
  return figure(value, 6);
}

export const amount = (value: number, unit: Unit, decimals = 2): string => withUnit(figure(value, decimals), unit);
export const quantity = ({ value, unit }: Quantity): string => amount(value, unit);

export const list = (items: readonly string[], last = "and"): string =>
  items.length < 2 ? items.join("") : `${items.slice(0, -1).join(", ")} ${last} ${items.at(-1)}`;

export const plural = (count: number, one: string, many = `${one}s`): string => `${count} ${count === 1 ? one : many}`;

/** The bare name inside a sentence: "Coolant" becomes "coolant", "CHT" and "Oil T" stay recognisable. */
export const midSentence = (name: string): string => (/^[A-Z][a-z]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name);

export const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
