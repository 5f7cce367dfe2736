import { command, query } from "@/app/_server/handle";
import { editPerson, getPersonRow } from "@/modules/identity";

export const GET = query(getPersonRow);
export const PATCH = command(editPerson);
