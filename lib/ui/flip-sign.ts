/**
 * What does a typed number read after the ± key? Keeps everything else as typed; an empty entry becomes "-".
 * @example flipSign("1.2") === "-1.2"
 * @example flipSign("−1.2") === "1.2"
 */
export function flipSign(typed: string): string {
  const text = typed.trimStart();
  if (text.startsWith("-") || text.startsWith("−")) return text.slice(1);
  if (text.startsWith("+")) return `-${text.slice(1)}`;
  return `-${text}`;
}
