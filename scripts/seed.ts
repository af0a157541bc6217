import { openDb } from "../db/open";
import { seedDemo } from "../db/seed";
import { env } from "../lib/env";
import { demoPassword } from "./lib/demo-settings.mjs";

const { DATABASE_FILE, DEMO_DATE, DEMO_PASSWORD } = env();
const db = openDb(DATABASE_FILE);
try {
  const today = new Date().toISOString().slice(0, 10);
  const { seeded, demoDate } = await seedDemo(db, { demoDate: DEMO_DATE ?? today, password: DEMO_PASSWORD ?? demoPassword });
  console.log(
    seeded ? `${DATABASE_FILE}: the demo programme of ${demoDate} is in.` : `${DATABASE_FILE} holds the demo programme of ${demoDate}.`,
  );
} finally {
  db.$client.close();
}
