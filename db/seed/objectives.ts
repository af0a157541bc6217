import type { Objective } from "@/lib/testcards/card";

export const OBJECTIVES: (Objective & { requirement: string })[] = [
  {
    code: "O1",
    question: "Does the engine stay inside its limits in a climb on the hot day?",
    success: "Coolant, CHT, oil T, TIT and IAT 'within' placard on the hot day in T10 to 9000 ft",
    priority: "must",
    requirement: "14 CFR 23.1043 (as before 2017), cooling tests",
  },
  {
    code: "O2",
    question: "Does it stay inside them on the ground and in taxi on the hot day?",
    success: "Coolant, CHT, oil T, TIT and IAT 'within' placard on the hot day in T01 and T05",
    priority: "must",
    requirement: "14 CFR 23.1043 (as before 2017), cooling tests",
  },
  {
    code: "O3",
    question: "Can it be stopped, left to soak and started again on the hot day?",
    success: "Coolant, skin and line 'within' on the hot day in T02 and T03; T04 starts in 3 tries; fuel P at least 2.6 bar in T26",
    priority: "must",
    requirement: "Team's own rule, PL-01 rev 2",
  },
  {
    code: "O4",
    question: "What power can be held if COWL sticks SHUT?",
    success: "One power at which T13 holds 8 min inside the card limits",
    priority: "must",
    requirement: "Team's own rule, PL-01 rev 2",
  },
  {
    code: "O5",
    question: "Does the engine pick up after an idle descent, without shock cooling?",
    success: "CHT fall at most 26 °C/min in T15; pick-up at most 2 s in T16",
    priority: "should",
    requirement: "Team's own rule, PL-01 rev 2",
  },
  {
    code: "O6",
    question: "Are speed, climb, cruise and fuel flow known well enough to trust the other results?",
    success: "Speed correction known to 2 kt; cruise and climb figures with their spread; fuel flow to 3 %",
    priority: "should",
    requirement: "Team's own rule, PL-01 rev 2",
  },
  {
    code: "O7",
    question: "Is the installation tight and sound before and after?",
    success: "No leak; exit gaps within 3 mm; vibration inside its limits; compression unchanged",
    priority: "must",
    requirement: "HF-4L-MM rev 4; PL-01 rev 2",
  },
];
