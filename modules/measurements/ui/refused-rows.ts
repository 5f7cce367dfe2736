import type { FieldProblem } from "@/lib/problem";

/** What the server said about rows, by the key under which each was sent: "/rows/3/shape" is about the fourth. */
export function refusedRows(
  errors: readonly FieldProblem[],
  sentKeys: readonly string[],
): ReadonlyMap<string, readonly FieldProblem[]> {
  const found = new Map<string, FieldProblem[]>();
  for (const error of errors) {
    const index = /^\/rows\/(\d+)(\/|$)/.exec(error.pointer)?.[1];
    const key = index === undefined ? undefined : sentKeys[Number(index)];
    if (key !== undefined) found.set(key, [...(found.get(key) ?? []), error]);
  }
  return found;
}
