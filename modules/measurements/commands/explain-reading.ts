import { defineCommand } from "@/modules/audit";
import { measurementsMay } from "../abilities";
import { measurementsEvents } from "../events";
import { addExplanation } from "../explanations";
import { explainReadingInput } from "../input";
import { areaOfReading } from "../points";

/** Adds a sentence that explains a reading. */
export const explainReading = defineCommand({
  verb: "explainReading",
  permission: measurementsMay.explain,
  input: explainReadingInput,
  areas: areaOfReading,
  run(ctx, { readingId, text }) {
    const explanationId = addExplanation(ctx, { readingId, text });
    return {
      result: { explanationId },
      event: { kind: measurementsEvents.explained, subject: { type: "reading", id: readingId } },
    };
  },
});
