import type { CardDocument } from "@/lib/testcards/card";
import type { Debrief } from "@/lib/testcards/debrief-types";
import type { StepDecision } from "@/lib/testcards/words";
import { commentOnCard } from "@/lib/workflow/card/comment-on-card";
import { reviseCard } from "@/lib/workflow/card/revise-card";
import { withdrawCard } from "@/lib/workflow/card/withdraw-card";
import { submitDebrief } from "@/lib/workflow/debrief/submit-debrief";
import { answerCard } from "@/lib/workflow/sortie/answer-card";
import { briefSortie } from "@/lib/workflow/sortie/brief-sortie";
import { disposePoint } from "@/lib/workflow/sortie/dispose-point";
import { planSortie } from "@/lib/workflow/sortie/plan-sortie";
import { getSortie } from "@/lib/workflow/sortie/queries";
import { countersignStep } from "@/lib/workflow/step/countersign-step";
import { proposeStep } from "@/lib/workflow/step/propose-step";
import { PROGRAMME_ID } from "./aircraft";
import { climbCard, cowlShutCard, DAYS, groundRunCard, POINT_IDS, taxiCard, unfinishedCard } from "./cards";
import { dayFrom } from "./days";
import { climbDebrief, groundRunDebrief } from "./debriefs";
import { answersTo, type Desk } from "./desk";
import { PEOPLE } from "./people";
import { SETTINGS } from "./settings";

/** The work of the last weeks, through the same use cases that people use: cards in every state, two sorties flown, one planned. */
export function doTheWork(desk: Desk, demoDate: string): void {
  const groundRun = desk.writeCard("01", -18, groundRunCard(demoDate));
  desk.sendForReview(groundRun, -18);
  const groundRunRevision = desk.release(groundRun, -17);
  flySortie(desk, demoDate, {
    day: DAYS.groundRun,
    kind: "ground run",
    revisionId: groundRunRevision,
    crew: ["pilot"],
    loading: { baggageKg: 0, fuelOnBoardL: 40, forecastOatC: 21 },
    debrief: groundRunDebrief,
    point: POINT_IDS.T01,
    step: { decision: "clear to next step", why: "above normal on the hot day, 5.6 °C in hand on coolant" },
  });

  const climb = desk.writeCard("07", -13, climbCard(demoDate, 60));
  desk.sendForReview(climb, -13);
  desk.release(climb, -12);
  withdrawCard(desk.as("reviewer", -11, "08:10"), { cardId: climb, letter: "A", why: "Exit gaps measured again before it is flown" });
  reviseCard(desk.as("engineer", -11, "09:00"), { cardId: climb });
  desk.sendForReview(climb, -11);
  desk.release(climb, -10);
  reviseCard(desk.as("engineer", -8, "09:00"), { cardId: climb });
  desk.rewrite(climb, -8, climbCard(demoDate));
  desk.sendForReview(climb, -8);
  const climbRevision = desk.release(climb, -7);
  flySortie(desk, demoDate, {
    day: DAYS.climb,
    kind: "flight",
    revisionId: climbRevision,
    crew: ["pilot", "observer"],
    loading: { baggageKg: 6, fuelOnBoardL: 64, forecastOatC: 18 },
    debrief: climbDebrief,
    point: POINT_IDS.T10,
    step: {
      decision: "hold",
      why: "Coolant 115.2 °C on the hot day against 115: more cooling, a higher climb speed, or a climb at reduced power",
    },
  });

  const taxi = desk.writeCard("05", -3, taxiCard(demoDate));
  const cowlShut = desk.writeCard("09", -2, cowlShutCard(demoDate));
  desk.sendForReview(taxi, -2);
  desk.writeCard("11", -1, unfinishedCard());
  desk.sendForReview(cowlShut, -1);
  commentOnCard(desk.as("pilot", -1, "14:00"), {
    cardId: cowlShut,
    pointId: null,
    text: "If the repeater drops out on the way up I call terminate and bring it home. Please say so at the brief.",
  });
  const taxiRevision = desk.release(taxi, -1);
  plan(desk, demoDate, {
    day: DAYS.taxi,
    plannedFrom: -1,
    kind: "taxi",
    revisionId: taxiRevision,
    crew: ["pilot"],
    loading: { baggageKg: 0, fuelOnBoardL: 40, forecastOatC: 31 },
  });
}

type Plan = {
  day: number;
  plannedFrom: number;
  kind: "ground run" | "taxi" | "flight";
  revisionId: string;
  crew: ("pilot" | "observer")[];
  loading: { baggageKg: number; fuelOnBoardL: number; forecastOatC: number };
};

const MASS_KG = { pilot: 92, observer: 72 };

function plan(desk: Desk, demoDate: string, { day, plannedFrom, kind, revisionId, crew, loading }: Plan): string {
  return planSortie(desk.as("engineer", plannedFrom, "18:00"), {
    programmeId: PROGRAMME_ID,
    kind,
    plannedOn: dayFrom(demoDate, day),
    crew: crew.map((role) => ({ userId: PEOPLE[role].id, name: PEOPLE[role].name, role, massKg: MASS_KG[role] })),
    revisionIds: [revisionId],
    settings: {
      ...loading,
      dayPlan: { daylight: "landing an hour before sunset", dutyTime: "pilot on duty 07:00 to 15:00", runway: "grass, 620 m, dry" },
    },
  }).id;
}

type Flight = Omit<Plan, "plannedFrom"> & {
  debrief: (document: CardDocument) => Debrief;
  point: string;
  step: { decision: StepDecision; why: string };
};

function flySortie(desk: Desk, demoDate: string, flight: Flight): void {
  const { day, revisionId, debrief, point, step } = flight;
  const sortieId = plan(desk, demoDate, { ...flight, plannedFrom: day - 1 });
  const pilot = (hhmm: string) => desk.as("pilot", day, hhmm);
  const ctx = pilot("07:30");
  const { cards } = getSortie(ctx.db, ctx.actor, sortieId, { today: ctx.today });
  const card = cards[0];
  if (!card) throw new Error("The demo's sortie has no card.");
  answerCard(pilot("07:30"), { sortieId, revisionId, digest: card.digest, answer: "accepted" });
  const { findings } = getSortie(ctx.db, ctx.actor, sortieId, { today: ctx.today });
  briefSortie(pilot("07:45"), { sortieId, goNoGo: SETTINGS.goNoGo.map((line) => ({ line, go: true })), answers: answersTo(findings) });
  submitDebrief(pilot("10:25"), { id: desk.newDebriefId(), sortieId, content: debrief(card.document) });
  disposePoint(desk.as("engineer", day, "13:00"), { sortieId, revisionId, pointId: point, disposition: "accept" });
  const { id, stands } = proposeStep(desk.as("engineer", day, "13:20"), { sortieId, revisionId, pointId: point, ...step });
  if (!stands) countersignStep(desk.as("reviewer", day, "16:00"), { stepId: id });
}
