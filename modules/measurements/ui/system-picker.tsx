"use client";
import { useRouter } from "next/navigation";
import { Field, Select } from "@/lib/ui";

export interface SystemPickerProps {
  /** The address without its query. */
  path: string;
  systems: readonly { readonly code: string; readonly name: string }[];
  selected: string | null;
}

/** Which system a page is about. */
export function SystemPicker({ path, systems, selected }: SystemPickerProps) {
  const router = useRouter();
  return (
    <Field label="System" required name="system" className="w-full max-w-sm">
      <Select
        placeholder="Choose a system"
        options={systems.map(({ code, name }) => ({ value: code, label: `${code} ${name}` }))}
        value={selected ?? ""}
        onChange={(event) =>
          router.push(
            event.target.value === "" ? path : `${path}?system=${encodeURIComponent(event.target.value)}`,
          )
        }
      />
    </Field>
  );
}
