export const MAIL_STATES = ["queued", "sent", "failed"] as const;
export type MailState = (typeof MAIL_STATES)[number];

/** A message in plain text. */
export type Letter = { to: string; subject: string; body: string; kind: string };
