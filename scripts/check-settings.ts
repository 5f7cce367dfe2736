import { readSettings, SettingsError } from "@/lib/env";

/** Ends with 1, naming each setting that is missing, weak or unsafe. */
try {
  readSettings(process.env);
} catch (error) {
  if (!(error instanceof SettingsError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
