"use client";
import { useEffect, useState } from "react";
import { timeText } from "@/lib/ui";

const TICK_MS = 5_000;

/** The time on the facility's wall, and where that is. Runs on from the server's moment, whatever this device's clock says. */
export function FacilityClock({ now, zone, facility }: { now: number; zone: string; facility: string }) {
  const [at, setAt] = useState(now);
  useEffect(() => {
    const began = performance.now();
    const timer = setInterval(() => setAt(now + performance.now() - began), TICK_MS);
    return () => clearInterval(timer);
  }, [now]);
  return (
    <>
      <span className="num text-ink">{timeText(at, zone, "time")}</span>
      <span className="max-md:sr-only"> {facility}</span>
    </>
  );
}
