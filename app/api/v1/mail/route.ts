import { query } from "@/app/_server/handle";
import { listMail } from "@/modules/notifications";

export const GET = query(listMail);
