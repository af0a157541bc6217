import { DebriefApp } from "@/components/debrief/debrief-app";

export const dynamic = "error"; // a build fails rather than let this page depend on the request

export default function DebriefShell() {
  return <DebriefApp />;
}
