import { KeptDebrief } from "./kept-debrief";

export const dynamic = "error"; // a build fails rather than let this page depend on the request

export default function DebriefShell() {
  return <KeptDebrief />;
}
