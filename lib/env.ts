import { resolve } from "node:path";
import { z } from "zod";

/** A setting left empty in a shell or an env file counts as not set. */
const optional = <S extends z.ZodType>(schema: S) => z.preprocess((value) => (value === "" ? undefined : value), schema);
const filePath = (fallback: string) => optional(z.string().default(fallback)).transform((path) => resolve(path as string));
const flag = optional(z.enum(["0", "1"], "must be 0 or 1").default("0")).transform((value) => value === "1");

/** The UTC day is checked as a real one: 2026-02-30 is refused. */
const day = z
  .string()
  .refine(
    (text) => /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text)) && new Date(text).toISOString().startsWith(text),
    "must be a day as YYYY-MM-DD",
  );

const Settings = z.object({
  DATABASE_FILE: filePath("data/greenarc.db"),
  FILES_DIR: filePath("data/files"),
  PORT: optional(z.coerce.number("must be a port number").int().min(1).max(65535).default(3000)),
  NEXTAUTH_URL: optional(z.url("must be the address people open, such as https://greenarc.example").optional()),
  NEXTAUTH_SECRET: optional(z.string().min(32, "must be at least 32 characters; make one with: openssl rand -base64 48").optional()),
  SMTP_URL: optional(z.url("must be a URL such as smtp://mail.example:587").optional()),
  MAIL_FROM: optional(z.string().optional()),
  S3_ENDPOINT: optional(z.url("must be a URL").optional()),
  S3_REGION: optional(z.string().optional()),
  S3_BUCKET: optional(z.string().min(3).optional()),
  S3_ACCESS_KEY_ID: optional(z.string().optional()),
  S3_SECRET_ACCESS_KEY: optional(z.string().optional()),
  DEMO_PASSWORD: optional(z.string().min(8, "must be at least 8 characters").optional()),
  DEMO_DATE: optional(day.optional()),
  /** 1 shows the demo sign-ins and the word demo; only `npm run demo` and `npm run dev` set it. */
  GREENARC_DEMO: flag,
});

export type Env = z.infer<typeof Settings>;

/** One line per setting that cannot be used, each naming the setting. */
export function readEnv(source: Record<string, string | undefined>): { env: Env; problems: [] } | { env: null; problems: string[] } {
  const parsed = Settings.safeParse(source);
  if (parsed.success) return { env: parsed.data, problems: [] };
  return { env: null, problems: parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`) };
}

let current: Env | undefined;

/** The settings of this process, read and checked once. */
export function env(): Env {
  if (current) return current;
  const read = readEnv(process.env);
  if (!read.env) throw new Error(`Settings: ${read.problems.join("; ")}`);
  current = read.env;
  return current;
}
