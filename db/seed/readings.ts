import { DAY_MS, MINUTE_MS, SECOND_MS } from "@/lib/clock";
import { invariant } from "@/lib/invariant";
import { confirmReading, explainReading, recordReadings } from "@/modules/measurements";
import type { ReadingAnswer } from "@/modules/measurements/model";
import { getParameter } from "@/modules/methods";
import { instrumentFor } from "./limits";
import { normal, numbersFor, uuidFor } from "./numbers";
import { DAYS, type Stage } from "./stage";
import { EPISODES, type Episode, LATE, UNCONFIRMED, UNREAD } from "./story.data";
import { AREAS, type SeriesSeed, SYSTEMS, type SystemSeed } from "./systems.data";

/** Seconds that one value takes on a round. */
const PACE_MS = 35 * SECOND_MS;
const BEGINS: Readonly<Record<string, string>> = {
  SHORE: "07:45",
  REEF: "08:05",
  DEEP: "08:20",
  DRIFT: "09:10",
  QUAR: "09:40",
};
const READERS: Readonly<Record<string, string>> = {
  SHORE: "joy",
  REEF: "joy",
  DEEP: "noor",
  DRIFT: "noor",
  QUAR: "tomas",
};

type Due = { system: SystemSeed; series: SeriesSeed; key: string; isSecond: boolean };
type Planned = { due: Due; text: string; unit: string | null; episode: Episode | null };

/** The noise of a series with memory (first-order autoregression), one number a day, the same for the same series. */
class Noise {
  readonly #next: () => number;
  #value = 0;
  constructor(
    key: string,
    private readonly memory: number,
  ) {
    this.#next = numbersFor(key);
  }
  step(): number {
    this.#value = this.memory * this.#value + Math.sqrt(1 - this.memory ** 2) * normal(this.#next);
    return this.#value;
  }
}

const noises = new Map<string, Noise>();

function usualValue(stage: Stage, due: Due, daysAgo: number): number {
  const { series, system, key } = due;
  const noise = noises.get(key) ?? new Noise(key, series.memory ?? 0);
  noises.set(key, noise);
  const dayOfYear = (stage.moment(daysAgo, "12:00") / DAY_MS) % 365.25;
  // The sea is warmest in the second half of August.
  const season = (series.season ?? 0) * Math.cos((2 * Math.PI * (dayOfYear - 232)) / 365.25);
  const warmed =
    system.code === "LARV-01" && series.parameter === "temperature" ? larvae(daysAgo) - series.base : 0;
  const seals =
    system.code === "SEAL-01" && series.parameter === "temperature" ? 12 - series.base + season * 0.6 : 0;
  const trend = (series.trendPerDay ?? 0) * (DAYS - daysAgo);
  return series.base + season + warmed + seals + trend + series.noise * noise.step();
}

/** 12 °C until 100 days ago, then a ramp to 16 °C over 92 days. */
function larvae(daysAgo: number): number {
  return 12 + 4 * Math.min(1, Math.max(0, (100 - daysAgo) / 92));
}

function dueOn(area: string, daysAgo: number, isSecond: boolean): Due[] {
  return SYSTEMS.filter((system) => system.area === area).flatMap((system) =>
    system.series
      .filter((series) =>
        isSecond
          ? series.twice
          : (DAYS - daysAgo) % series.everyDays === series.everyDays - 1 || series.everyDays === 1,
      )
      .map((series) => ({
        system,
        series,
        isSecond,
        key: `${system.code}/${series.point ?? ""}/${series.parameter}${isSecond ? "/2" : ""}`,
      })),
  );
}

function plan(stage: Stage, due: Due, daysAgo: number): Planned {
  const parameter = getParameter(stage.db.writer.orm, stage.parameter(due.series.parameter));
  const usual = usualValue(stage, due, daysAgo);
  const episode = EPISODES.find(
    (each) =>
      each.system === due.system.code &&
      each.parameter === due.series.parameter &&
      each.point === due.series.point &&
      each.from >= daysAgo &&
      each.until <= daysAgo,
  );
  if (episode) {
    return { due, text: episode.text(usual, episode.from - daysAgo), unit: episode.unit ?? null, episode };
  }
  if (parameter.kind === "yes-no") return { due, text: "yes", unit: null, episode: null };
  const least = parameter.mayBeNegative ? usual : Math.max(usual, 10 ** -parameter.decimals);
  return {
    due,
    text: least.toFixed(parameter.kind === "count" ? 0 : parameter.decimals),
    unit: null,
    episode: null,
  };
}

function confirmAndExplain(
  stage: Stage,
  reader: string,
  at: number,
  planned: Planned,
  answer: ReadingAnswer,
  daysAgo: number,
): void {
  if (answer.status !== "out" && answer.status !== "implausible") return;
  const { due, episode } = planned;
  if (UNCONFIRMED.has(`${due.system.code}/${due.series.parameter}/${daysAgo}`)) return;
  stage.act(reader, at, confirmReading, { readingId: answer.readingId });
  const text =
    episode?.explanation ?? "Looked again, the instrument shows the same; watching it on the next round.";
  stage.act(reader, at, explainReading, { readingId: answer.readingId, text });
}

/** One area's round: every due value in walking order, recorded together as the sheet is sent. */
function walk(stage: Stage, area: string, daysAgo: number, isSecond: boolean): void {
  const dues = dueOn(area, daysAgo, isSecond);
  const planned = dues.map((due) => plan(stage, due, daysAgo));
  if (planned.length === 0 || UNREAD.some((each) => each.area === area && each.daysAgo === daysAgo)) return;
  const begin = stage.moment(daysAgo, isSecond ? "15:30" : (BEGINS[area] ?? "09:00"));
  const late = LATE.find((each) => each.area === area && each.daysAgo === daysAgo);
  const reader = READERS[area] ?? "noor";
  const enteredBy = late ? "tomas" : reader;
  const end = late ? stage.moment(daysAgo - 1, "10:30") : begin + planned.length * PACE_MS;
  const source = late ? ("grid" as const) : ("entry" as const);
  stage.plan(end, () => {
    const readings = planned.map((each, index) => ({
      ...toSend(stage, each, daysAgo),
      takenAt: begin + index * PACE_MS,
      takenBy: stage.people.get(reader) ?? null,
      note: late?.note ?? null,
    }));
    const answers = stage.act(enteredBy, end, recordReadings, { source, readings }).readings;
    answers.forEach((answer, index) => {
      const each = planned[index];
      invariant(each, "an answer belongs to what was sent");
      confirmAndExplain(stage, enteredBy, end + MINUTE_MS, each, answer, daysAgo);
    });
  });
}

function toSend(stage: Stage, { due, text, unit }: Planned, daysAgo: number) {
  return {
    uuid: uuidFor(`${due.key} ${stage.day(daysAgo)}`),
    pointId: stage.point(due.system.code, due.series.point),
    parameterId: stage.parameter(due.series.parameter),
    typedText: text,
    typedUnit: unit,
    methodId: stage.methodIds.get(due.series.parameter) ?? null,
    instrumentId: instrumentOf(stage, due, daysAgo),
  };
}

/** The new probe is used at the kelp forest from the day on which the old one was found wrong. */
function instrumentOf(stage: Stage, due: Due, daysAgo: number): number | null {
  const isNewProbe = due.series.parameter === "ph_nbs" && due.system.area === "SHORE" && daysAgo <= 31;
  return isNewProbe ? (stage.instrumentIds.get("PH-02") ?? null) : instrumentFor(stage, due.series.parameter);
}

/** All rounds of one day. */
export function seedDay(stage: Stage, daysAgo: number): void {
  for (const { code } of AREAS) walk(stage, code, daysAgo, false);
  for (const { code } of AREAS) walk(stage, code, daysAgo, true);
}
