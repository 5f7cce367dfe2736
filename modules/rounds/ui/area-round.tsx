import type { ReactNode } from "react";
import { LinkButton, Panel } from "@/lib/ui";
import type { Bounds } from "@/modules/measurements/model";
import type { FacilityParameter } from "@/modules/methods/model";
import type { OldValue, SheetCounts, SheetGap, SheetLine, SheetState } from "../model";
import { DeviationList } from "./deviation-list";
import { GapList } from "./gap-list";
import { countWords, type Names, readingsWord, WAITED_FOR } from "./sheet-words";

export interface AreaRoundProps {
  area: { code: string; name: string };
  onDay: string;
  counts: SheetCounts;
  state: SheetState;
  lines: readonly SheetLine[];
  gaps: readonly SheetGap[];
  bounds: Readonly<Record<number, Bounds>>;
  oldValues: Readonly<Record<number, OldValue>>;
  parameters: readonly FacilityParameter[];
  names: Names;
  zone: string;
  now: number;
  mayEnter: boolean;
  /** What stands beside a reading that is off and not explained. */
  besideOff?: ((readingId: number) => ReactNode) | undefined;
}

/** An area's day on the page of rounds: what is off first, then what is missing. */
export function AreaRound(props: AreaRoundProps) {
  const { area, onDay, counts, state, lines, gaps, now, mayEnter } = props;
  const off = lines.filter(
    ({ status }) => status === "out" || status === "implausible" || status === "watch",
  );
  const found = countWords(counts);
  const isEmpty = counts.readings === 0 && counts.gaps === 0;
  return (
    <Panel
      title={area.name}
      aside={
        isEmpty ? "nothing read, nothing due" : `${readingsWord(counts.readings)} · ${WAITED_FOR[state]}`
      }
      actions={
        <LinkButton size="small" href={`/rounds/${area.code}/${onDay}`}>
          Day sheet<span className="sr-only"> of {area.name}</span>
        </LinkButton>
      }
    >
      {found.length > 0 && <p className="mb-3">{found.join(" · ")}</p>}
      {off.length > 0 && <DeviationList {...props} lines={off} />}
      {gaps.length > 0 && (
        <div className={off.length > 0 ? "mt-4" : ""}>
          <h3 className="mb-2">Not read yet</h3>
          <GapList gaps={gaps} now={now} mayEnter={mayEnter} />
        </div>
      )}
      {found.length === 0 && !isEmpty && (
        <p className="text-ink-2">Everything due has been read; nothing deviates.</p>
      )}
    </Panel>
  );
}
