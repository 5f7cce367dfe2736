/** Tables whose rows are not captured in the history, each with its reason. Every other table is. */
export const EXEMPT_TABLES: Readonly<Record<string, string>> = {
  audit_entry: "is the history itself; refuses UPDATE and DELETE",
  audit_change: "is the history itself; refuses UPDATE and DELETE",
  audit_idempotency: "holds answers that were already given, to give them again; says nothing new",
  audit_job: "is work in hand; what a job does is an entry of its own",
  identity_credential:
    "holds password hashes, which must not be copied; each change is an entry that says so",
  identity_session: "is touched by every request; beginning and end of a session are entries",
  identity_one_time_link: "holds hashes of secrets that live for hours; making and using one are entries",
  identity_throttle: "counts failed sign-ins for minutes",
  notifications_mail: "is mail in transit; queueing and what became of it are told by the mail's own columns",
  imports_staged_row: "holds rows of a file before they are accepted; the file itself is kept with its hash",
  imports_progress: "counts how far a file has been worked through; what came of it is told by the import",
  __drizzle_migrations: "belongs to the migrator; each migration is an entry",
};
