import { createHash } from "node:crypto";
import { mkdir, rename, writeFile } from "node:fs/promises";
import path from "node:path";
import { createTransport } from "nodemailer";
import { settings } from "@/lib/env";

type Outgoing = { id: number; to: string; subject: string; body: string; queuedAt: number };

function message(letter: Outgoing) {
  const { MAIL_FROM, STILLWELL_URL } = settings();
  const stamp = createHash("sha256")
    .update(`${letter.id} ${letter.queuedAt} ${letter.to}`)
    .digest("hex")
    .slice(0, 32);
  return {
    from: MAIL_FROM,
    to: letter.to,
    subject: letter.subject,
    text: letter.body,
    date: new Date(letter.queuedAt),
    messageId: `<${stamp}@${new URL(STILLWELL_URL).hostname}>`,
  };
}

function smtpTransport() {
  const { SMTP_HOST, SMTP_PORT, SMTP_SECURE, SMTP_USER, SMTP_PASSWORD } = settings();
  return createTransport({
    host: SMTP_HOST,
    port: SMTP_PORT,
    secure: SMTP_SECURE,
    ...(SMTP_USER ? { auth: { user: SMTP_USER, pass: SMTP_PASSWORD } } : {}),
    disableFileAccess: true,
    disableUrlAccess: true,
    connectionTimeout: 15_000,
    socketTimeout: 30_000,
  });
}

/** Folder of written mail under the data folder. */
export function mailFolder(): string {
  return path.join(settings().dataFolder, "mail");
}

async function writeLetter(letter: Outgoing): Promise<string> {
  const composer = createTransport({ streamTransport: true, buffer: true, newline: "windows" });
  const composed = await composer.sendMail(message(letter));
  const fileName = `${String(letter.id).padStart(6, "0")}.eml`;
  const target = path.join(mailFolder(), fileName);
  await mkdir(mailFolder(), { recursive: true });
  await writeFile(`${target}.part`, composed.message as Buffer);
  await rename(`${target}.part`, target);
  return fileName;
}

/** Sends by SMTP, or writes an .eml file into the data folder (the default). Rejects where the letter did not go. */
export async function sendLetter(letter: Outgoing): Promise<{ fileName: string | null }> {
  if (settings().MAIL_TRANSPORT === "file") return { fileName: await writeLetter(letter) };
  await smtpTransport().sendMail(message(letter));
  return { fileName: null };
}
