import { command, query } from "@/app/_server/handle";
import { askForBackup, listBackups } from "@/modules/audit";

export const GET = query(listBackups);
export const POST = command(askForBackup);
