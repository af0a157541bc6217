"use client";
import { DebriefApp } from "@/components/debrief/debrief-app";
import { debriefDrafts } from "@/lib/offline/debrief-drafts";

/** Joins the form to this phone's storage. */
export function KeptDebrief() {
  return <DebriefApp store={debriefDrafts} />;
}
