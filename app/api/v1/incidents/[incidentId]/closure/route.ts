import { command } from "@/app/_server/handle";
import { closeIncident } from "@/modules/quality";

export const POST = command(closeIncident);
