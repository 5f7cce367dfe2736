import Link from "next/link";

interface GridAreasProps {
  areas: readonly { readonly id: number; readonly name: string }[];
  chosen: readonly number[];
}

/** Which areas stand on the sheet: each is put on it or taken off by a press. */
export function GridAreas({ areas, chosen }: GridAreasProps) {
  if (areas.length < 2) return null;
  return (
    <nav aria-label="Areas on the sheet" className="flex flex-wrap items-center gap-2">
      {areas.map(({ id, name }) => {
        const isChosen = chosen.includes(id);
        const next = isChosen ? chosen.filter((each) => each !== id) : [...chosen, id];
        const isLast = isChosen && next.length === 0;
        return (
          <Link
            key={id}
            href={isLast ? "/rounds/grid" : `/rounds/grid?areas=${[...next].sort((a, b) => a - b).join(",")}`}
            className="btn answer-button !min-h-12"
            data-chosen={isChosen || undefined}
            aria-current={isChosen ? "true" : undefined}
          >
            {name}
            <span className="sr-only">
              {isChosen ? ", on the sheet; take it off" : ", put it on the sheet"}
            </span>
          </Link>
        );
      })}
    </nav>
  );
}
