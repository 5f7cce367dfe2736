import "server-only";

export { identityMay } from "./abilities";
export { bindAreas } from "./commands/bind-areas";
export { createFirstAdministrator } from "./commands/create-first-administrator";
export { decideRole } from "./commands/decide-role";
export { editPerson } from "./commands/edit-person";
export { endRole } from "./commands/end-role";
export { grantRole } from "./commands/grant-role";
export { invitePerson } from "./commands/invite-person";
export { endDeputy, nameDeputy } from "./commands/name-deputy";
export { preferUnits } from "./commands/prefer-units";
export { reinstatePerson } from "./commands/reinstate-person";
export { repeatInvitation } from "./commands/repeat-invitation";
export { setPassword } from "./commands/set-password";
export { endSession } from "./commands/start-session";
export { suspendPerson } from "./commands/suspend-person";
export { identityEvents } from "./events";
export { findOpenLink } from "./links";
export { addressesOf, findActivePerson, mustBeAnother } from "./people";
export {
  getOwnAccount,
  getPersonRow,
  listDeputies,
  listPeople,
  listPersonNames,
} from "./queries/list-people";
export { hashPassword } from "./rules/password";
export { actorOf, endEverySession, findSession, type SessionLookup, touchSession } from "./sessions/actor";
export { askForReset, changeOwnPassword, confirmPassword, setPasswordByLink } from "./sessions/passwords";
export { type SignIn, signIn } from "./sessions/sign-in";
