import { notFound } from "next/navigation";

/** Any address no page answers: the desk says so in its own words. */
export default function Missing(): never {
  notFound();
}
