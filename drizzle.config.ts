import { defineConfig } from "drizzle-kit";

/** Drizzle's own view of the tables, used only to generate migrations (`npm run db:generate`). */
export default defineConfig({
  dialect: "sqlite",
  schema: ["./modules/*/schema.ts", "./db/*.schema.ts"],
  out: "./db/migrations",
});
