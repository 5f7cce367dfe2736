import "server-only";
import { processSingleton } from "@/lib/process-singleton";
import { useReactions, useRecordGates } from "@/modules/audit";
import { REACTIONS } from "./reactions";
import { RECORD_GATES } from "./record-gates";

/** What every entry into the product needs once: which work follows which event, who may read which record. */
export function prepareRuntime(): void {
  processSingleton("runtime", () => {
    useReactions(REACTIONS);
    useRecordGates(RECORD_GATES);
    return true;
  });
}
