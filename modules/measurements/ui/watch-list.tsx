import { Button, DataTable } from "@/lib/ui";
import { unitLabel } from "@/lib/units/factors";
import type { FacilityParameter, InstrumentRow, MethodRow } from "@/modules/methods/model";
import type { PointRow } from "@/modules/systems/model";
import type { WatchPlanRow } from "../model";

export interface WatchListProps {
  point: PointRow;
  items: readonly WatchPlanRow[];
  parameters: readonly FacilityParameter[];
  methods: readonly MethodRow[];
  instruments: readonly InstrumentRow[];
  onChange: (() => void) | null;
}

/** "every day", "every 7 days", "when wanted". */
export function oftenWords(everyDays: number | null): string {
  if (everyDays === null) return "when wanted";
  return everyDays === 1 ? "every day" : `every ${everyDays} days`;
}

/** What is read at one point, in its order. */
export function WatchList({ point, items, parameters, methods, instruments, onChange }: WatchListProps) {
  const parameterOf = (item: WatchPlanRow) => parameters.find((each) => each.id === item.parameterId);
  return (
    <div className="grid gap-3">
      <DataTable
        caption={`What is read at ${point.systemCode} ${point.name}`}
        rows={items}
        rowKey={(item) => item.parameterId}
        empty={<p className="text-ink-2">Nothing is read here yet.</p>}
        columns={[
          {
            id: "parameter",
            head: "Parameter",
            rowHead: true,
            cell: (item) => parameterOf(item)?.name ?? "a retired parameter",
          },
          { id: "often", head: "How often", tight: true, cell: (item) => oftenWords(item.everyDays) },
          {
            id: "unit",
            head: "Typed in",
            cell: (item) => unitLabel(item.unit ?? parameterOf(item)?.unit ?? null),
          },
          {
            id: "method",
            head: "Usual method",
            wideOnly: true,
            cell: (item) => methods.find((each) => each.id === item.methodId)?.code,
          },
          {
            id: "instrument",
            head: "Usual instrument",
            wideOnly: true,
            cell: (item) => instruments.find((each) => each.id === item.instrumentId)?.code,
          },
        ]}
      />
      {onChange && (
        <div>
          <Button aria-label={`Change what is read at ${point.systemCode} ${point.name}`} onClick={onChange}>
            Change
          </Button>
        </div>
      )}
    </div>
  );
}
