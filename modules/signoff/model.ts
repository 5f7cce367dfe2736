/** A signature as it is shown beside what it belongs to. */
export type SignatureShown = {
  id: number;
  personId: number;
  printedName: string;
  roles: string[];
  meaning: string;
  comment: string | null;
  signedAt: number;
  contentHash: string;
  /** Whether what is there now is what was signed; null where nobody has compared. */
  holds: boolean | null;
};

/** The first eight characters of a hash in two groups, for people: `7f3a·c2e9`. */
export function shortHash(hash: string): string {
  return `${hash.slice(0, 4)}·${hash.slice(4, 8)}`;
}
