import { command, query } from "@/app/_server/handle";
import { addCatalogue, listCatalogue } from "@/modules/methods";

export const GET = query(listCatalogue);
export const POST = command(addCatalogue);
