import { command } from "@/app/_server/handle";
import { reinstatePerson } from "@/modules/identity";

export const POST = command(reinstatePerson);
