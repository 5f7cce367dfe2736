import type { Metadata } from "next";
import { PERMISSION_TABLES } from "@/app/_server/all-permissions";
import { mustMay } from "@/app/_server/session";
import { PageHead } from "@/lib/ui";
import { identityMay } from "@/modules/identity";
import { PermissionTable } from "@/modules/identity/ui/permission-table";

export const metadata: Metadata = { title: "Roles" };

export default async function RolesPage() {
  await mustMay(identityMay.listPeople);
  return (
    <>
      <PageHead
        title="Roles"
        facts="Made from the very table by which the server decides. Beyond it, nobody reviews, approves or releases their own work, whatever roles they hold."
      />
      <PermissionTable tables={PERMISSION_TABLES} />
    </>
  );
}
