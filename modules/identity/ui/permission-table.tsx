import { type Permission, ROLES, type Role, type Scope } from "@/modules/access";
import { roleText } from "./role-words";

export interface PermissionTableProps {
  tables: readonly { title: string; permissions: Readonly<Record<string, Permission>> }[];
}

const SCOPE_WORDS: Record<Scope, string> = { everywhere: "yes", "own areas": "own areas" };

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

function Cell({ permission, role }: { permission: Permission; role: Role }) {
  const scope = permission.roles[role];
  if (scope === undefined) {
    return (
      <td className="text-center text-ink-3">
        <span aria-hidden="true">–</span>
        <span className="sr-only">no</span>
      </td>
    );
  }
  return <td className="text-center font-semibold whitespace-nowrap">{SCOPE_WORDS[scope]}</td>;
}

/** Role × permission, module by module, for people. What only the product itself does is left out. */
export function PermissionTable({ tables }: PermissionTableProps) {
  return (
    <div className="table-scroll" tabIndex={0} role="region" aria-label="What each role may do">
      <table className="data-table">
        <caption className="sr-only">What each role may do</caption>
        <thead>
          <tr>
            <th scope="col">May</th>
            {ROLES.map((role) => (
              <th key={role} scope="col" className="text-center">
                {roleText(role)}
              </th>
            ))}
          </tr>
        </thead>
        {tables.map((table) => (
          <tbody key={table.title}>
            <tr>
              <th scope="colgroup" colSpan={ROLES.length + 1} className="pt-5 font-head text-base">
                {table.title}
              </th>
            </tr>
            {Object.values(table.permissions)
              .filter((permission) => !permission.bySystem)
              .map((permission) => (
                <tr key={permission.code}>
                  <th scope="row" className="min-w-56 font-normal">
                    {capital(permission.says)}
                  </th>
                  {ROLES.map((role) => (
                    <Cell key={role} permission={permission} role={role} />
                  ))}
                </tr>
              ))}
          </tbody>
        ))}
      </table>
    </div>
  );
}
