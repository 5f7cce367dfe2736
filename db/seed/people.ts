import { MINUTE_MS } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { SYSTEM_ACTOR } from "@/modules/access";
import { runCommand } from "@/modules/audit";
import {
  bindAreas,
  createFirstAdministrator,
  hashPassword,
  invitePerson,
  setPassword,
} from "@/modules/identity";
import { DEMO_PASSWORD, emailOf, PEOPLE } from "./people.data";
import { DAYS, type Stage } from "./stage";

/** The secret of the newest invitation, as its reader finds it in the letter. */
function invitationSecret(stage: Stage): string {
  const row = stage.db.writer.sqlite
    .prepare("select body from notifications_mail order by id desc limit 1")
    .get();
  const found = /\/invitation\/([\w-]+)/.exec((row as { body: string }).body);
  invariant(found?.[1], "an invitation carries its link");
  return found[1];
}

/** The administrator comes first and invites everybody else; each chooses a password by the link. */
export async function seedPeople(stage: Stage): Promise<void> {
  const begin = stage.moment(DAYS + 3, "09:00");
  stage.clock.set(begin);
  for (const [index, person] of PEOPLE.entries()) {
    const at = begin + index * 7 * MINUTE_MS;
    stage.clock.set(at);
    const passwordHash = await hashPassword(DEMO_PASSWORD);
    if (index === 0) {
      const { result } = runCommand(
        stage.db,
        SYSTEM_ACTOR,
        createFirstAdministrator,
        { name: person.name, email: emailOf(person.key), passwordHash, roles: [...person.roles] },
        { clock: stage.clock },
      );
      stage.people.set(person.key, result.personId);
      continue;
    }
    const { personId } = stage.act("marek", at, invitePerson, {
      name: person.name,
      email: emailOf(person.key),
      roles: [...person.roles],
    });
    const token = invitationSecret(stage);
    stage.clock.set(at + 4 * MINUTE_MS);
    runCommand(stage.db, SYSTEM_ACTOR, setPassword, { token, passwordHash }, { clock: stage.clock });
    stage.people.set(person.key, personId);
  }
}

/** Once there are areas: who works where. */
export function seedBindings(stage: Stage): void {
  for (const { key, areas } of PEOPLE) {
    if (!areas) continue;
    const areaIds = areas.map((code) => stage.areaIds.get(code) ?? 0);
    stage.act("marek", stage.moment(DAYS + 2, "12:00"), bindAreas, {
      personId: stage.people.get(key) ?? 0,
      areaIds,
    });
  }
}
