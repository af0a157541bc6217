import { readdirSync } from "node:fs";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { toActor } from "@/lib/auth/roles";
import { ROLES, type Role } from "@/lib/testcards/words";
import type { Ctx } from "@/lib/workflow/context";
import { MAY, may, type Permission } from "@/lib/workflow/permissions";
import type { UseCase } from "@/lib/workflow/use-case";
import { newDesk } from "../support/new-desk";

/** Who may what, typed again from the team's table: a slip in the code's own table shows here. */
const TABLE: Record<Permission, Role[]> = {
  "manage people": ["admin"],
  "edit programme": ["engineer"],
  "keep instruments": ["engineer", "mechanic"],
  "write cards": ["engineer"],
  "comment in review": ["engineer", "reviewer", "pilot"],
  "release cards": ["reviewer"],
  "plan sorties": ["engineer"],
  "accept cards": ["pilot"],
  "brief and debrief": ["pilot"],
  "sign configuration": ["mechanic"],
  "rectify squawks": ["mechanic"],
  "assess squawks": ["engineer"],
  "amend readings": ["engineer"],
  "propose a step": ["engineer"],
  "countersign a step": ["reviewer"],
  "say hold": ["engineer", "reviewer", "pilot", "mechanic"],
  "raise a squawk": ["engineer", "reviewer", "pilot", "mechanic"],
  "upload recordings": ["engineer", "pilot", "mechanic"],
  "read and print": ["admin", "engineer", "reviewer", "pilot", "mechanic", "observer"],
};

const EXPECTED: Record<string, Permission> = {
  "card.create": "write cards",
  "card.save-draft": "write cards",
  "card.submit": "write cards",
  "card.revise": "write cards",
  "card.return": "release cards",
  "card.release": "release cards",
  "card.withdraw": "release cards",
  "card.comment": "comment in review",
  "card.print": "read and print",
  "configuration.sign": "sign configuration",
  "sortie.plan": "plan sorties",
  "sortie.change": "plan sorties",
  "sortie.answer-card": "accept cards",
  "sortie.enter-loading": "brief and debrief",
  "sortie.brief": "brief and debrief",
  "sortie.close": "plan sorties",
  "sortie.cancel": "plan sorties",
  "debrief.submit": "brief and debrief",
  "point.dispose": "amend readings",
  "step.propose": "propose a step",
  "step.hold": "say hold",
  "step.countersign": "countersign a step",
  "squawk.raise": "raise a squawk",
  "squawk.assess": "assess squawks",
  "squawk.rectify": "rectify squawks",
  "squawk.accept": "assess squawks",
  "squawk.verify": "rectify squawks",
  "squawk.close": "assess squawks",
  "session.end": "read and print",
  "session.end-all": "read and print",
};

/** Every use case of the code, found in its folder: a new one without a line above fails here. */
async function findUseCases(): Promise<UseCase<unknown>[]> {
  const root = join(import.meta.dirname, "../../lib/workflow");
  const files = readdirSync(root, { recursive: true, encoding: "utf8" }).filter((file) => /^\w[\w-]*\/\w[\w-]*\.ts$/.test(file));
  const modules = await Promise.all(files.map((file) => import(join(root, file)) as Promise<Record<string, unknown>>));
  const isUseCase = (thing: unknown): thing is UseCase<unknown> => typeof thing === "function" && "useCase" in thing;
  return modules.flatMap((module) => Object.values(module).filter(isUseCase));
}

const useCases = await findUseCases();
let cells = 0;
afterAll(() => console.info(`${cells} cells of who may what were tried`));

/** Past its gate a use case meets an empty input, so anything but "forbidden" proves that the gate stood open. */
function isForbidden(act: UseCase<unknown>, ctx: Ctx): boolean {
  cells += 1;
  try {
    act(ctx, "nothing that any schema takes");
    return false;
  } catch (error) {
    return (error as { code?: string }).code === "forbidden";
  }
}

const desk = newDesk();
const ctxWith = (roles: readonly Role[]): Ctx => {
  const { actor } = desk.as("observer");
  return { ...desk.as("observer"), actor: toActor({ ...actor, roles }) };
};

describe("the table of who may what", () => {
  test("is the team's own, cell by cell", () => {
    expect(MAY).toEqual(TABLE);
    for (const [permission, roles] of Object.entries(TABLE) as [Permission, Role[]][])
      for (const role of ROLES) {
        cells += 1;
        expect([permission, role, may({ roles: [role] }, permission)]).toEqual([permission, role, roles.includes(role)]);
      }
  });

  test("covers every use case of the code, and each is named once", () => {
    expect(Object.fromEntries(useCases.map(({ useCase, permission }) => [useCase, permission]))).toEqual(EXPECTED);
    expect(new Set(useCases.map(({ useCase }) => useCase)).size).toBe(useCases.length);
  });
});

describe.each(useCases.map((act) => [act.useCase, act] as const))("%s", (name, act) => {
  const allowed = TABLE[EXPECTED[name] ?? "manage people"];

  test.each(ROLES)("asked by one who is only %s", (role) => {
    expect(isForbidden(act, ctxWith([role]))).toBe(!allowed.includes(role));
  });

  test("asked by one who holds every role, and by one who holds none", () => {
    expect(isForbidden(act, ctxWith(ROLES))).toBe(false);
    expect(isForbidden(act, ctxWith([]))).toBe(true);
  });

  test("asked by one who holds every role that may not, and with the first that may beside them", () => {
    const others = ROLES.filter((role) => !allowed.includes(role));
    expect(isForbidden(act, ctxWith(others))).toBe(true);
    expect(isForbidden(act, ctxWith([...others, ...allowed.slice(0, 1)]))).toBe(false);
  });

  test("says who may, and leaves no trace", () => {
    const { actor } = desk.as("observer");
    const before = desk.audit().length;
    let said = "";
    try {
      act(ctxWith([]), {});
    } catch (error) {
      said = (error as Error).message;
    }
    expect(said).toMatch(/^Only an? [\w, ]+ may /);
    expect(actor.roles).toEqual(["observer"]);
    expect(desk.audit()).toHaveLength(before);
  });
});
