/**
 * Which menu entry does a path belong to? The one with the longest href that is the path or a folder above it;
 * undefined when none is. `/` belongs to itself alone.
 * @example currentHref([{ href: "/systems" }, { href: "/systems/map" }], "/systems/map/3") === "/systems/map"
 */
export function currentHref(items: readonly { href: string }[], path: string): string | undefined {
  const clean = path.split(/[?#]/, 1)[0] ?? "";
  let best: string | undefined;
  for (const { href } of items) {
    const above = href === "/" ? clean === "/" : clean === href || clean.startsWith(`${href}/`);
    if (above && href.length > (best?.length ?? -1)) best = href;
  }
  return best;
}
