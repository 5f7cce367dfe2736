import { REACTIONS, WORK } from "@/app/_server/reactions";
import { openDatabase } from "@/db/database";
import { SetClock, systemClock } from "@/lib/clock";
import { settings } from "@/lib/env";
import { migrateDatabase, useReactions } from "@/modules/audit";
import { seedImports } from "./imports";
import { seedLimitStory, seedLimits } from "./limits";
import { seedChecks, seedMethods } from "./methods";
import { seedBindings, seedPeople } from "./people";
import { seedDay } from "./readings";
import { seedReview } from "./review";
import { DAYS, Stage } from "./stage";
import { seedStory } from "./story";
import { seedSystems, seedVolumeStory } from "./systems";

/**
 * Makes the demonstration: Corran Sound Marine Station, invented, six months up to now, through the product's own commands.
 * The same day and hour give the same data (passwords' salts and one-time links apart). STILLWELL_SEED_AT (epoch
 * milliseconds) sets another "now".
 */
async function main(): Promise<void> {
  const { databaseFile, STILLWELL_SEED_AT } = settings();
  const began = systemClock.now();
  const now = STILLWELL_SEED_AT ?? began;
  const db = openDatabase(databaseFile);
  useReactions(REACTIONS);
  const stage = new Stage(db, now, WORK);
  migrateDatabase(db, new SetClock(stage.moment(DAYS + 3, "08:00")));
  await seedPeople(stage);
  seedSystems(stage);
  seedBindings(stage);
  seedMethods(stage);
  await seedLimits(stage);
  for (let daysAgo = DAYS; daysAgo >= 0; daysAgo -= 1) {
    seedDay(stage, daysAgo);
    seedReview(stage, daysAgo);
  }
  seedChecks(stage);
  seedLimitStory(stage);
  seedVolumeStory(stage);
  seedStory(stage);
  seedImports(stage);
  await stage.play();
  stage.clock.set(now);
  await stage.settle();
  const count = (table: string) =>
    (db.writer.sqlite.prepare(`select count(*) as n from ${table}`).get() as { n: number }).n;
  console.log(
    `Seeded ${count("measurements_reading")} readings and ${count("audit_entry")} history entries in ${Math.round((systemClock.now() - began) / 1000)} s.`,
  );
  db.writer.sqlite.pragma("wal_checkpoint(TRUNCATE)");
  db.close();
}

main().catch((cause: unknown) => {
  console.error(cause);
  process.exitCode = 1;
});
