import "server-only";
import { processSingleton } from "@/lib/process-singleton";
import { useReactions } from "@/modules/audit";
import { REACTIONS } from "./reactions";

/** What every entry into the product needs once: which work follows which event. */
export function prepareRuntime(): void {
  processSingleton("runtime", () => {
    useReactions(REACTIONS);
    return true;
  });
}
