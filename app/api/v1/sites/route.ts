import { command, query } from "@/app/_server/handle";
import { createSite, listSites } from "@/modules/systems";

export const GET = query(listSites);
export const POST = command(createSite);
