import type { Role } from "@/lib/domain/permissions/permissions";

interface RolesTableProps {
  readonly roles: readonly { readonly role: Role; readonly name: string }[];
  readonly rows: readonly { readonly sentence: string; readonly roles: readonly Role[] }[];
}

/** Who may do what: the very table by which the server decides. */
export function RolesTable({ roles, rows }: RolesTableProps) {
  return (
    <table className="w-full max-w-[46rem] border-collapse text-left text-15">
      <caption className="sr-only">What each role may do</caption>
      <thead>
        <tr className="text-13 text-pencil">
          <th scope="col" className="pb-2 font-normal">
            May
          </th>
          {roles.map(({ role, name }) => (
            <th key={role} scope="col" className="w-20 px-1 pb-2 text-center font-normal sm:w-28">
              {name}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.sentence} className="border-t border-hair">
            <th scope="row" className="py-2 pr-3 font-normal">
              {row.sentence}
            </th>
            {roles.map(({ role }) => (
              <td key={role} className="py-2 text-center">
                {row.roles.includes(role) ? (
                  <>
                    <svg
                      width="16"
                      height="16"
                      viewBox="0 0 16 16"
                      aria-hidden="true"
                      className="inline-block"
                      fill="none"
                    >
                      <path d="m3 8.5 3.5 3.5L13 4.5" stroke="currentColor" strokeWidth="2" strokeLinecap="round" />
                    </svg>
                    <span className="sr-only">yes</span>
                  </>
                ) : (
                  <span className="text-pencil">
                    <span aria-hidden="true">–</span>
                    <span className="sr-only">no</span>
                  </span>
                )}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
