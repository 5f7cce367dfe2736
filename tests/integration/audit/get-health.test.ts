import { describe, expect, it } from "vitest";
import { HOUR_MS } from "@/lib/clock";
import { getHealth } from "@/modules/audit";
import { invitePerson } from "@/modules/identity";
import { countMail, notificationsMay } from "@/modules/notifications";
import { NOON, testBench } from "../../support/database";

describe("the health of the installation", () => {
  it("tells of room, size and work that is due; a letter that waits is counted and is work", () => {
    const bench = testBench();
    const admin = bench.person("Ada Quill", ["admin"]);
    const calm = bench.ask(admin, getHealth, {});
    expect(calm).toMatchObject({ jobsDue: 0, oldestDueAt: null, jobsFailed: 0, lastBackupAt: null });
    expect(calm.databaseBytes).toBeGreaterThan(4096);
    expect(calm.diskFreeBytes).toBeLessThanOrEqual(calm.diskTotalBytes);
    bench.run(admin, invitePerson, {
      name: "Joe Okafor",
      email: "joe@corran.example",
      roles: ["aquarist"],
      areaIds: [],
    });
    bench.clock.set(NOON + HOUR_MS);
    expect(bench.ask(admin, getHealth, {})).toMatchObject({ jobsDue: 1, oldestDueAt: NOON });
    expect(bench.ask(admin, countMail, {})).toEqual({ queued: 1, sent: 0, failed: 0 });
  });

  it("is for administrators and auditors, as is the mail", () => {
    const bench = testBench();
    const auditor = bench.person("Rune Aske", ["auditor"]);
    const joe = bench.person("Joe Okafor", ["aquarist"]);
    expect(bench.ask(auditor, getHealth, {}).jobsDue).toBe(0);
    expect(() => bench.ask(joe, getHealth, {})).toThrow("does not allow");
    expect(notificationsMay.readOutbox.roles).toEqual({ admin: "everywhere", auditor: "everywhere" });
    expect(bench.ask(auditor, countMail, {}).queued).toBe(0);
    expect(() => bench.ask(joe, countMail, {})).toThrow("does not allow");
  });
});
