import { command } from "@/app/_server/handle";
import { addIncidentNote } from "@/modules/quality";

export const POST = command(addIncidentNote);
