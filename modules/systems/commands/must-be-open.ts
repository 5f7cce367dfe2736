import { Problem } from "@/lib/problem";
import type { DeterminationStatus } from "../model";

/**
 * A proposed volume is decided on once.
 * @throws Problem `conflict`
 */
export function mustBeOpen(proposed: { status: DeterminationStatus }): void {
  if (proposed.status === "proposed") return;
  throw new Problem(
    "conflict",
    `This volume has been ${proposed.status} already; load the page again to see by whom.`,
  );
}
