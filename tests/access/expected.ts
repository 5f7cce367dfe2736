import { MATRIX_ROLES, type MatrixRole, type MatrixRow } from "./matrix.data";
import { OUTSIDERS, type Outsider, type Visitor } from "./visitors";

const isOutsider = (visitor: Visitor): visitor is Outsider =>
  (OUTSIDERS as readonly string[]).includes(visitor);
const isRole = (visitor: Visitor): visitor is MatrixRole =>
  (MATRIX_ROLES as readonly string[]).includes(visitor);

/** Whether the matrix lets a visitor in. */
export function isLetIn({ may }: MatrixRow, visitor: Visitor): boolean {
  if (may === "anybody") return true;
  if (isOutsider(visitor)) return false;
  if (may === "signed in") return true;
  return isRole(visitor) && may.includes(visitor);
}

/** How somebody without a session that counts is turned away: a page leads to the sign-in page, the interface says 401. */
export type Kind = "page" | "read" | "write";

/** The status that the matrix expects. */
export function expectedStatus(kind: Kind, row: MatrixRow, visitor: Visitor): number {
  if (isLetIn(row, visitor)) return row.letIn ?? (kind === "write" ? 422 : 200);
  if (isOutsider(visitor)) return kind === "page" ? 307 : 401;
  return 403;
}
