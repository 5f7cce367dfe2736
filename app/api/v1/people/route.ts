import { command, query } from "@/app/_server/handle";
import { invitePerson, listPeople } from "@/modules/identity";

export const GET = query(listPeople);
export const POST = command(invitePerson);
