import { timeText } from "@/lib/ui";

/** A calendar day as it is read: "2 Mar 2026". @example dayWords("2026-03-02") === "2 Mar 2026" */
export const dayWords = (on: string): string => timeText(Date.parse(`${on}T12:00:00Z`), "UTC", "day");
