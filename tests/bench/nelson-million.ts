/**
 * Prints how much processor time one million points take through an individuals chart with all eight Nelson tests, each test alone,
 * and the ratio to one plain pass over the same numbers, measured in one run.
 *
 * Run: npx tsx tests/bench/nelson-million.ts
 */
import { controlRuleHits, individualsLimits, NELSON_RULES } from "../../modules/statistics";

const POINTS = 1_000_000;
const REPEATS = 9;

/** Seeded numbers that are close to normal: the sum of twelve uniform ones. */
function seededValues(n: number): Float64Array {
  let state = 20260101;
  const uniform = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
  return Float64Array.from({ length: n }, () => {
    let sum = -6;
    for (let i = 0; i < 12; i++) sum += uniform();
    return 8.1 + 0.05 * sum;
  });
}

/** Least processor time of several runs in milliseconds, after two to warm up: other work on the machine counts little. */
function timeOf(work: () => unknown): number {
  work();
  work();
  const times = Array.from({ length: REPEATS }, () => {
    const start = process.cpuUsage();
    work();
    const { user, system } = process.cpuUsage(start);
    return (user + system) / 1000;
  });
  return Math.min(...times);
}

const values = seededValues(POINTS);
const { centre, sigma } = individualsLimits({ values });

function plainPass(): number {
  let beyond = 0;
  for (let i = 0; i < values.length; i++) if (Math.abs(values[i]! - centre) > 3 * sigma) beyond++;
  return beyond;
}

const all = timeOf(() => controlRuleHits({ values, centre, sigma, rules: NELSON_RULES }));
const plain = timeOf(plainPass);
console.log(`${POINTS.toLocaleString("en-GB")} points, least processor time of ${REPEATS} runs`);
console.log(`limits (centre, moving ranges)  ${timeOf(() => individualsLimits({ values })).toFixed(1)} ms`);
console.log(`all eight Nelson tests          ${all.toFixed(1)} ms`);
for (const rule of NELSON_RULES) {
  const alone = timeOf(() => controlRuleHits({ values, centre, sigma, rules: [rule] }));
  console.log(`  ${rule} alone                      ${alone.toFixed(1)} ms`);
}
console.log(
  `one plain pass                  ${plain.toFixed(1)} ms; all eight take ${(all / plain).toFixed(0)} times that`,
);
