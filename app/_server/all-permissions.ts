import "server-only";
import type { Permission } from "@/modules/access";
import { auditMay } from "@/modules/audit";
import { identityMay } from "@/modules/identity";
import { importsMay } from "@/modules/imports";
import { measurementsMay } from "@/modules/measurements";
import { methodsMay } from "@/modules/methods";
import { notificationsMay } from "@/modules/notifications";
import { qualityMay } from "@/modules/quality";
import { roundsMay } from "@/modules/rounds";
import { systemsMay } from "@/modules/systems";

/** Every module's permissions under the words that people know the module by. A module with abilities stands here
 * (tests/architecture/menu.test.ts sees to it). */
export const PERMISSION_TABLES: readonly {
  title: string;
  permissions: Readonly<Record<string, Permission>>;
}[] = [
  { title: "Areas and systems", permissions: systemsMay },
  { title: "Parameters, methods and instruments", permissions: methodsMay },
  { title: "Readings and limits", permissions: measurementsMay },
  { title: "Imports", permissions: importsMay },
  { title: "Charts and incidents", permissions: qualityMay },
  { title: "Rounds and the review of the day", permissions: roundsMay },
  { title: "People and accounts", permissions: identityMay },
  { title: "Mail", permissions: notificationsMay },
  { title: "History", permissions: auditMay },
];

export const ALL_PERMISSIONS: readonly Permission[] = PERMISSION_TABLES.flatMap((table) =>
  Object.values(table.permissions),
);
