/** What happened at Corran Sound in the six months: how one series differs from its usual run on some days. */
export type Episode = {
  system: string;
  parameter: string;
  point?: string;
  /** Days before today, both included; `until` is the nearer one. */
  from: number;
  until: number;
  /** What is read instead of the usual value; `since` counts the days from the beginning of the episode. */
  text(usual: number, since: number): string;
  unit?: string;
  /** The explanation that the aquarist gives, for readings that are off. */
  explanation?: string;
};

const fixed = (value: number, decimals: number): string => value.toFixed(decimals);

export const EPISODES: readonly Episode[] = [
  {
    system: "KELP-01",
    parameter: "ph_nbs",
    from: 76,
    until: 32,
    text: (usual, since) => fixed(usual - 0.006 * since, 2),
    explanation: "pH looks low; bench meter reads higher. Probe suspected.",
  },
  {
    system: "COLD-01",
    parameter: "temperature",
    from: 96,
    until: 95,
    text: (usual, since) => fixed(usual + (since === 0 ? 4.4 : 2.3), 1),
    explanation: "Chiller 1 tripped in the night; contractor called, spare chiller connected.",
  },
  {
    system: "KELP-01",
    parameter: "oxygen",
    point: "BOTTOM",
    from: 2,
    until: 0,
    text: (_usual, since) => fixed([5.94, 5.71, 5.83][since] ?? 5.9, 2),
    explanation: "Low at the bottom again; circulation pump 2 pulls less current than usual.",
  },
  {
    system: "SEAL-01",
    parameter: "enterococci",
    from: 76,
    until: 64,
    text: (_usual, since) => (since > 6 ? "TNTC" : "140"),
    explanation: "Backwash was missed after the weekend; repeated sample taken.",
  },
  {
    system: "ELAS-01",
    parameter: "pump_running",
    from: 22,
    until: 22,
    text: () => "no",
    explanation: "Pump 1 stopped for a new seal, pump 2 carries the flow.",
  },
  { system: "LARV-01", parameter: "ammonia_n", from: 400, until: 0, text: () => "<0.05" },
  {
    system: "KELP-02",
    parameter: "temperature",
    from: 60,
    until: 54,
    text: (usual) => fixed(usual * 1.8 + 32, 1),
    unit: "°F",
  },
  {
    system: "REEF-01",
    parameter: "alkalinity",
    from: 120,
    until: 90,
    text: (usual) => fixed(usual * 2.80385, 1),
    unit: "dKH",
  },
  { system: "JELLY-01", parameter: "temperature", from: 1, until: 1, text: () => "158" },
  { system: "COLD-02", parameter: "ammonia_n", from: 49, until: 21, text: () => "ND" },
];

/** A whole area that nobody read on a day. */
export const UNREAD: readonly { area: string; daysAgo: number }[] = [{ area: "DRIFT", daysAgo: 12 }];

/** A round that was typed in a day later from paper. */
export const LATE: readonly { area: string; daysAgo: number; note: string }[] = [
  { area: "DEEP", daysAgo: 18, note: "Entered late: power failure in the plant room, read on paper." },
];

/** Readings that are confirmed by nobody yet, so that something waits. */
export const UNCONFIRMED = new Set(["JELLY-01/temperature/1"]);
