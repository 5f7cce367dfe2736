import type { APIRequestContext } from "@playwright/test";
import { expect } from "./browser";

/** Something that is read, as the product itself says it, and two values for it that are within. */
export interface WithinRow {
  systemCode: string;
  parameterName: string;
  /** The target; it asks for no confirmation, whatever was read before. */
  value: string;
  /** The target and one in the last digit. */
  otherValue: string;
}

interface Row {
  systemCode: string;
  isDefaultPoint: boolean;
  unit: string | null;
  parameter: { kind: string; name: string; unit: string | null; decimals: number };
  limits: { state: string; bounds?: { target?: number; watchHigh?: number; greatestChange24h?: number } };
}

/**
 * The first thing that the signed-in person reads (at this system and of this name, where they are given) that has a target
 * and no greatest change in 24 h: no other test can put its target off by what it enters.
 */
export async function withinRow(
  request: APIRequestContext,
  wanted: { systemCode?: string | undefined; parameterName?: string | undefined } = {},
): Promise<WithinRow> {
  const answer = await request.get("/api/v1/watch?recent=1");
  expect(answer.ok()).toBe(true);
  const { data } = (await answer.json()) as { data: Row[] };
  for (const { systemCode, isDefaultPoint, unit, parameter, limits } of data) {
    const { target, watchHigh, greatestChange24h } = limits.bounds ?? {};
    if (wanted.systemCode !== undefined && wanted.systemCode !== systemCode) continue;
    if (wanted.parameterName !== undefined && wanted.parameterName !== parameter.name) continue;
    if (parameter.kind !== "number" || unit !== parameter.unit || !isDefaultPoint) continue;
    if (target === undefined || greatestChange24h !== undefined) continue;
    const other = target + 10 ** -parameter.decimals;
    if (other > (watchHigh ?? other)) continue;
    return {
      systemCode,
      parameterName: parameter.name,
      value: target.toFixed(parameter.decimals),
      otherValue: other.toFixed(parameter.decimals),
    };
  }
  throw new Error(`nothing here has a target and no greatest change: ${JSON.stringify(wanted)}`);
}
