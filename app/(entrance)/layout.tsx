import type { ReactNode } from "react";
import { PlainFrame } from "@/app/_shell/plain-frame";
import { settings } from "@/lib/env";

export default function EntranceLayout({ children }: { children: ReactNode }) {
  return <PlainFrame facility={settings().STILLWELL_FACILITY}>{children}</PlainFrame>;
}
