import { command, query } from "@/app/_server/handle";
import { listDeputies, nameDeputy } from "@/modules/identity";

export const GET = query(listDeputies);
export const POST = command(nameDeputy);
