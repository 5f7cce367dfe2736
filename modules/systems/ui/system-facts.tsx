import Link from "next/link";
import { type Fact, Facts, numberText, Panel, TimeText } from "@/lib/ui";
import { convertByFactor } from "@/lib/units/factors";
import {
  EQUIPMENT_KIND_WORDS,
  type EquipmentRow,
  SYSTEM_STATE_WORDS,
  type VolumeSheet,
  type VolumeUnit,
} from "../model";
import { VolumeQuantity } from "./volume-quantity";

const METHOD_WORDS = { geometry: "geometry", tracer: "tracer test" } as const;

/** Why a system does not hold its volume of record today: its level, drained, whom it shares its water with. */
function whyToday({ level, operating, operatingSays, joinedWith }: VolumeSheet): string {
  if (operating === null) return operatingSays ?? "cannot be told";
  const offsetCm = level === null ? 0 : convertByFactor(level.levelOffsetM, "m", "cm");
  const levelWords = level?.isDrained
    ? `drained: ${level.reason}`
    : offsetCm === 0
      ? "at the level of the record"
      : `level ${offsetCm > 0 ? "+" : "−"}${numberText(Math.abs(offsetCm), 1)} cm: ${level?.reason ?? ""}`;
  const names = joinedWith.map((each) => each.code).join(", ");
  return names === "" ? levelWords : `${levelWords}; shares its water with ${names}`;
}

/** The volume of record with how and when it was found, and what the system holds today and why that differs. */
export function SystemVolumeFacts({
  sheet,
  unit,
  zone,
}: {
  sheet: VolumeSheet;
  unit: VolumeUnit;
  zone: string;
}) {
  const { record, operating, system } = sheet;
  const href = `/systems/${system.code}/volume`;
  if (record === null) {
    const none: Fact = { label: "Volume of record", value: <Link href={href}>none approved yet</Link> };
    return <Facts facts={[none]} />;
  }
  const recordL = { value: record.volumeL, standardUncertainty: record.standardUncertaintyL };
  return (
    <div className="max-w-[27rem]">
      <Facts
        facts={[
          {
            label: <Link href={href}>Volume of record</Link>,
            value: <VolumeQuantity volumeL={recordL} unit={unit} />,
            note: (
              <>
                {METHOD_WORDS[record.method]}, <TimeText at={record.effectiveFromAt} zone={zone} show="day" />
              </>
            ),
          },
          {
            label: "Holds today",
            value: <VolumeQuantity volumeL={operating} unit={unit} />,
            note: whyToday(sheet),
          },
        ]}
      />
    </div>
  );
}

/** A system's machines and vessels, those out of use named so. */
export function EquipmentPanel({
  equipment,
  setupHref,
}: {
  equipment: readonly EquipmentRow[];
  setupHref: string | null;
}) {
  const kept = equipment.filter((each) => each.state !== "retired");
  return (
    <Panel
      title="Equipment"
      id="equipment"
      actions={
        setupHref && (
          <Link className="link inline-flex min-h-6 items-center" href={setupHref}>
            Set up
          </Link>
        )
      }
    >
      {kept.length === 0 ? (
        <p className="text-ink-2">None listed.</p>
      ) : (
        <ul className="border-t border-rule">
          {kept.map((each) => (
            <li key={each.id} className="flex flex-wrap items-baseline gap-x-3 border-b border-rule py-2">
              <b className="font-semibold">{each.code}</b>
              <span>{each.name}</span>
              <span className="ml-auto text-sm text-ink-2">
                {EQUIPMENT_KIND_WORDS[each.kind]}
                {each.state === "out-of-service" && (
                  <b className="font-semibold">, {SYSTEM_STATE_WORDS[each.state]}</b>
                )}
              </span>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
