import Form from "next/form";
import Link from "next/link";
import { Button, DateInput, Field } from "@/lib/ui";

/** The stretches of time that a chart offers, by their word in the address. */
export const PERIODS = [
  { code: "7d", words: "7 days", days: 7 },
  { code: "30d", words: "30 days", days: 30 },
  { code: "90d", words: "90 days", days: 90 },
  { code: "1y", words: "1 year", days: 366 },
  { code: "all", words: "all", days: null },
] as const;
export type PeriodCode = (typeof PERIODS)[number]["code"];

interface PeriodChoiceProps {
  /** The page itself, without search. */
  path: string;
  /** Code of the point, kept in every link; null for the default one. */
  point: string | null;
  /** The preset in force; null where days were chosen. */
  period: PeriodCode | null;
  fromOn: string;
  toOn: string;
}

/** From when until when: a preset, or two days. */
export function PeriodChoice({ path, point, period, fromOn, toOn }: PeriodChoiceProps) {
  const hrefOf = (code: string) =>
    `${path}?${new URLSearchParams({ ...(point === null ? {} : { point }), period: code })}`;
  return (
    <div className="flex flex-wrap items-end gap-x-8 gap-y-4 pb-5">
      <nav aria-label="Period">
        <ul className="flex flex-wrap gap-1.5">
          {PERIODS.map(({ code, words }) => (
            <li key={code}>
              <Link
                className="btn aria-[current]:border-water aria-[current]:bg-wash"
                data-variant="plain"
                aria-current={code === period ? "true" : undefined}
                href={hrefOf(code)}
              >
                {words}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      <Form action={path} className="flex flex-wrap items-end gap-3">
        {point !== null && <input type="hidden" name="point" value={point} />}
        <Field label="From" name="from" required>
          <DateInput name="from" defaultValue={fromOn} key={fromOn} required />
        </Field>
        <Field label="to" name="to" required>
          <DateInput name="to" defaultValue={toOn} key={toOn} required />
        </Field>
        <Button type="submit">Show</Button>
      </Form>
    </div>
  );
}
