import { eq } from "drizzle-orm";
import type { Db } from "@/db/open";
import { settings } from "@/db/schema";
import { hashPassword } from "@/lib/auth/password";
import { openDesk } from "./desk";
import { insertPeople, insertProgramme } from "./programme";
import { doTheWork } from "./work";

export const DEMO_DATE_KEY = "demo-date";

export function demoDateOf(db: Db): string | null {
  return db.select({ value: settings.value }).from(settings).where(eq(settings.key, DEMO_DATE_KEY)).get()?.value ?? null;
}

/** Fills an empty database with the demo programme, whole or not at all. A database that holds it already is left as it is. */
export async function seedDemo(
  db: Db,
  { demoDate, password }: { demoDate: string; password: string },
): Promise<{ seeded: boolean; demoDate: string }> {
  const before = demoDateOf(db);
  if (before !== null) return { seeded: false, demoDate: before };
  const passwordHash = await hashPassword(password); // before the transaction: this driver cannot wait inside one
  const seed = db.$client.transaction(() => {
    const meanwhile = demoDateOf(db);
    if (meanwhile !== null) return { seeded: false, demoDate: meanwhile };
    db.insert(settings).values({ key: DEMO_DATE_KEY, value: demoDate }).run();
    insertPeople(db, demoDate, passwordHash);
    insertProgramme(db, demoDate);
    doTheWork(openDesk(db, demoDate), demoDate);
    return { seeded: true, demoDate };
  });
  return seed.immediate();
}
