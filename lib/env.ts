import { randomBytes } from "node:crypto";
import path from "node:path";
import { z } from "zod";
import { processSingleton } from "@/lib/process-singleton";

/** A secret that ships in examples or is too short protects nobody. */
const WEAK_SECRETS = ["secret", "changeme", "change-me", "stillwell", "development", "password"];

const isZone = (zone: string): boolean => {
  try {
    return Boolean(new Intl.DateTimeFormat("en-GB", { timeZone: zone }));
  } catch {
    return false;
  }
};

const flag = z.enum(["0", "1", "false", "true"]).transform((text) => text === "1" || text === "true");

/** Every setting of the product, read once. The README's table lists the same names. */
const settingsSchema = z.object({
  NODE_ENV: z.enum(["development", "production", "test"]).default("development"),
  STILLWELL_DATA: z.string().min(1).default("./data"),
  STILLWELL_URL: z.url().default("http://localhost:3000"),
  STILLWELL_ZONE: z
    .string()
    .refine(isZone, "is not an IANA time zone such as Europe/London")
    .default("Europe/London"),
  STILLWELL_DAY_CUT: z
    .string()
    .regex(/^([01]\d|2[0-3]):[0-5]\d$/, "must be a time of day such as 06:00")
    .default("06:00"),
  STILLWELL_FACILITY: z.string().min(1).max(80).default("Corran Sound Marine Station"),
  NEXTAUTH_SECRET: z.string().optional(),
  SESSION_IDLE_MINUTES: z.coerce.number().int().min(5).max(10_080).default(720),
  SESSION_ABSOLUTE_HOURS: z.coerce.number().int().min(1).max(720).default(168),
  TRUST_PROXY_HOPS: z.coerce.number().int().min(0).max(5).default(0),
  MAIL_TRANSPORT: z.enum(["file", "smtp"]).default("file"),
  MAIL_FROM: z.string().min(3).default("Stillwell <stillwell@localhost>"),
  SMTP_HOST: z.string().optional(),
  SMTP_PORT: z.coerce.number().int().min(1).max(65_535).default(587),
  SMTP_USER: z.string().optional(),
  SMTP_PASSWORD: z.string().optional(),
  SMTP_SECURE: flag.default(false),
  IMPORT_MAX_MB: z.coerce.number().int().min(1).max(200).default(200),
  LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "silent"]).default("info"),
  /** The moment that the demonstration is made for; now where it is left out. */
  STILLWELL_SEED_AT: z.coerce.number().int().positive().optional(),
  STILLWELL_JOBS: flag.default(true),
});

export type Settings = z.infer<typeof settingsSchema> & {
  /** Absolute folder that holds the database, uploads and written mail. */
  dataFolder: string;
  databaseFile: string;
  /** Minutes after local midnight at which the operational day begins. */
  dayCutMinutes: number;
  secureCookies: boolean;
};

/** A setting that is missing, weak or unsafe; the message names each. */
export class SettingsError extends Error {
  constructor(readonly problems: string[]) {
    super(
      `Stillwell does not start with these settings:\n${problems.map((line) => `  - ${line}`).join("\n")}`,
    );
    this.name = "SettingsError";
  }
}

/**
 * Reads the settings from an environment.
 * @throws SettingsError naming every setting that is wrong, in production also a missing or weak secret.
 */
export function readSettings(env: Record<string, string | undefined>): Settings {
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ""));
  const parsed = settingsSchema.safeParse(given);
  if (!parsed.success) {
    throw new SettingsError(parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`));
  }
  const settings = parsed.data;
  const problems = unsafeSettings(settings);
  if (problems.length > 0) throw new SettingsError(problems);
  const [hours = "6", minutes = "0"] = settings.STILLWELL_DAY_CUT.split(":");
  const dataFolder = path.resolve(/* turbopackIgnore: true */ settings.STILLWELL_DATA);
  return {
    ...settings,
    dataFolder,
    databaseFile: path.join(dataFolder, "stillwell.db"),
    dayCutMinutes: Number(hours) * 60 + Number(minutes),
    secureCookies: settings.STILLWELL_URL.startsWith("https:"),
  };
}

function unsafeSettings(settings: z.infer<typeof settingsSchema>): string[] {
  const problems: string[] = [];
  if (settings.MAIL_TRANSPORT === "smtp" && !settings.SMTP_HOST) {
    problems.push("SMTP_HOST: is needed when MAIL_TRANSPORT is smtp");
  }
  if (settings.NODE_ENV !== "production") return problems;
  problems.push(...secretProblems(settings.NEXTAUTH_SECRET));
  const url = new URL(settings.STILLWELL_URL);
  const isLocal = ["localhost", "127.0.0.1", "[::1]"].includes(url.hostname);
  if (url.protocol !== "https:" && !isLocal) {
    problems.push("STILLWELL_URL: must begin with https: unless the site is reached on this machine alone");
  }
  return problems;
}

function secretProblems(secret: string | undefined): string[] {
  if (!secret) return ["NEXTAUTH_SECRET: is missing; make one with `openssl rand -base64 32`"];
  const isWeak =
    WEAK_SECRETS.some((weak) => secret.toLowerCase().includes(weak)) || new Set(secret).size < 10;
  if (secret.length < 32 || isWeak) {
    return ["NEXTAUTH_SECRET: is too weak; make one with `openssl rand -base64 32` (32 characters or more)"];
  }
  return [];
}

let current: Settings | undefined;

/** The settings of this process. */
export function settings(): Settings {
  current ??= withSecret(readSettings(process.env));
  return current;
}

/** While developing, a secret of this process will do: whoever restarts it signs in again. Production has refused before. */
function withSecret(read: Settings): Settings {
  if (read.NEXTAUTH_SECRET || read.NODE_ENV === "production") return read;
  return {
    ...read,
    NEXTAUTH_SECRET: processSingleton("secret", () => randomBytes(32).toString("base64")),
  };
}

/** Tells next-auth, which reads the environment itself, at which address the site is reached. */
export function tellNextAuth(): void {
  process.env.NEXTAUTH_URL ||= settings().STILLWELL_URL;
}

/** Puts other settings in place of the process's own; tests, seeds and command-line tools alone. */
export function useSettings(replacement: Settings): void {
  current = replacement;
}
