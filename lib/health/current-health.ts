import "server-only";
import { getDb } from "@/db/client";
import { env } from "@/lib/env";
import { checkHealth } from "./check-health";

export const currentHealth = () => checkHealth(getDb, env().DATABASE_FILE);
