import { defineEvents } from "@/modules/audit/model";

export const identityEvents = defineEvents({
  invited: ["person.invited", 1, "invited a person"],
  inviteRepeated: ["person.invited-again", 1, "sent an invitation again"],
  edited: ["person.edited", 1, "corrected a person's name or address"],
  suspended: ["person.suspended", 1, "suspended a person"],
  reinstated: ["person.reinstated", 1, "let a person back in"],
  roleGranted: ["role.granted", 1, "granted a role"],
  roleDecided: ["role.decided", 1, "decided on a role that a person granted to themselves"],
  roleEnded: ["role.ended", 1, "ended a role"],
  areasBound: ["person.areas-bound", 1, "changed the areas a person is bound to"],
  deputyNamed: ["deputy.named", 1, "named a deputy"],
  deputyEnded: ["deputy.ended", 1, "ended a deputyship"],
  sessionStarted: ["session.started", 1, "signed in"],
  sessionEnded: ["session.ended", 1, "signed out"],
  resetRequested: ["password.reset-requested", 1, "asked for a new password"],
  passwordSet: ["password.set", 1, "set a password by a one-time link"],
  passwordChanged: ["password.changed", 1, "changed a password"],
  unitsPreferred: ["person.units-preferred", 1, "chose the units to read and type"],
});
