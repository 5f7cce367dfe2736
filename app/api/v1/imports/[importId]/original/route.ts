import { route } from "@/app/_server/handle";
import { sendOriginal } from "@/app/_server/import-files";

export const GET = route(sendOriginal);
