import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { demoSignIns } from "@/lib/auth/public-ctx";
import { findCtx } from "@/lib/auth/request-ctx";
import { SIGN_IN_REFUSED } from "@/lib/auth/sign-in";
import { SignInForm } from "./sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

/** Only a path of our own: never another site, never a scheme. */
function ownPath(next: string | string[] | undefined): string {
  return typeof next === "string" && /^\/(?![/\\])[^\\\s]*$/.test(next) ? next : "/";
}

export default async function SignInPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const next = ownPath((await searchParams).next);
  if (await findCtx()) redirect(next);
  return (
    <div className="mx-auto grid w-full max-w-5xl gap-10 px-4 py-10 desk:grid-cols-[1fr_24rem] desk:py-16">
      <div>
        <h1 className="font-bold text-2xl">Test cards, the flight, the debrief, the verdict</h1>
        <p className="max-w-prose pt-3 text-lg">
          For a small team that has changed an engine installation on a light aircraft and must find out, step by step, whether it stays
          inside its limits on the ground, in the air and on the hottest day it will ever see.
        </p>
        <ol className="max-w-prose pt-6">
          {STEPS.map(([head, text], i) => (
            <li key={head} className="grid grid-cols-[2rem_1fr] border-rule border-t py-3">
              <span className="font-bold">{i + 1}</span>
              <span>
                <strong>{head}</strong> <span className="text-ink-soft">{text}</span>
              </span>
            </li>
          ))}
        </ol>
      </div>
      <SignInForm next={next} refused={SIGN_IN_REFUSED} demo={demoSignIns()} />
    </div>
  );
}

const STEPS: [string, string][] = [
  ["Write the card.", "What to set, what to record, what must never be exceeded, when to stop: in gauge numbers the pilot can see."],
  ["Have it released.", "By somebody who did not write it. What was released stays as it was."],
  ["Fly it on paper.", "One sheet on one knee. No screen in the air."],
  ["Debrief on the phone.", "In the ten minutes before the detail fades, with or without a signal."],
  [
    "Read the verdict.",
    "Corrected for the gauge, taken to the hot day, judged with its uncertainty. What cannot be judged is never a pass.",
  ],
];
