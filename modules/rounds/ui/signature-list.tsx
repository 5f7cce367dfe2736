import { TimeText } from "@/lib/ui";
import { type SignatureShown, shortHash } from "@/modules/signoff/model";

export interface SignatureListProps {
  signatures: readonly SignatureShown[];
  hashNow: string;
  zone: string;
}

const MEANINGS: Readonly<Record<string, string>> = { reviewed: "Reviewed", returned: "Returned" };

/** The signatures under a sheet, oldest first: name, time, meaning, hash; broken where the content is another by now. */
export function SignatureList({ signatures, hashNow, zone }: SignatureListProps) {
  return (
    <div className="grid gap-2">
      {signatures.length === 0 ? (
        <p className="text-ink-2">Nobody has signed this sheet yet.</p>
      ) : (
        <ul className="divide-y divide-rule border-t border-rule">
          {signatures.map((one) => (
            <li key={one.id} className="py-2.5 break-inside-avoid">
              <p>
                <b className="font-semibold">{MEANINGS[one.meaning] ?? one.meaning}</b> by{" "}
                <b className="font-semibold">{one.printedName}</b>, <TimeText at={one.signedAt} zone={zone} />
                <span className="num ml-2 text-sm text-ink-3">hash {shortHash(one.contentHash)}</span>
              </p>
              {one.comment !== null && <p className="text-ink-2">“{one.comment}”</p>}
              {one.holds === false && (
                <p className="font-semibold text-out">
                  Broken: the sheet has changed since. This signature stands for what was there then, not for
                  what stands here now.
                </p>
              )}
            </li>
          ))}
        </ul>
      )}
      <p className="text-sm text-ink-3">
        What stands here now has the hash <span className="num">{shortHash(hashNow)}</span>.
      </p>
    </div>
  );
}
