import { query } from "@/app/_server/handle";
import { listWaitingVolumes } from "@/modules/systems";

export const GET = query(listWaitingVolumes);
