"use client";
import { useState } from "react";
import { EmptyState, LinkButton, PageHead, Panel, useDone } from "@/lib/ui";
import type { FacilityParameter, InstrumentRow, MethodRow } from "@/modules/methods/model";
import type { PointRow } from "@/modules/systems/model";
import type { WatchPlanRow } from "../model";
import { SystemPicker } from "./system-picker";
import { WatchEditor } from "./watch-editor";
import { WatchList } from "./watch-list";

export interface WatchSetupProps {
  systems: { code: string; name: string }[];
  /** The system the page is about, and its points in use; null until one is chosen. */
  selected: { code: string; points: PointRow[] } | null;
  /** Every point that one may copy from. */
  allPoints: PointRow[];
  plan: WatchPlanRow[];
  parameters: FacilityParameter[];
  methods: MethodRow[];
  instruments: InstrumentRow[];
  mayPlan: boolean;
}

/** Setup: what is read at each point of a system, in which order, how often and with what. */
export function WatchSetup(props: WatchSetupProps) {
  const { systems, selected, plan, mayPlan } = props;
  const [open, setOpen] = useState<number | null>(null);
  const done = useDone();
  return (
    <>
      <PageHead
        title="What is read where"
        facts="Which parameters are read at each point, in which order and how often: the rows of entry sheets and rounds."
      />
      <div className="grid gap-5">
        {systems.length === 0 ? (
          <EmptyState
            title="No systems yet"
            actions={<LinkButton href="/setup/systems">Set up systems</LinkButton>}
          >
            Readings are taken at the points of a system. Set up the systems first.
          </EmptyState>
        ) : (
          <SystemPicker path="/setup/watch" systems={systems} selected={selected?.code ?? null} />
        )}
        {selected?.points.map((point) => {
          const items = plan.filter((each) => each.pointId === point.id);
          return (
            <Panel key={point.id} title={point.name} aside={point.isDefault ? "default point" : undefined}>
              {open === point.id ? (
                <WatchEditor
                  {...props}
                  point={point}
                  items={items}
                  onClose={() => setOpen(null)}
                  onDone={(text) => {
                    setOpen(null);
                    done(text);
                  }}
                />
              ) : (
                <WatchList
                  {...props}
                  point={point}
                  items={items}
                  onChange={mayPlan && open === null ? () => setOpen(point.id) : null}
                />
              )}
            </Panel>
          );
        })}
      </div>
    </>
  );
}
