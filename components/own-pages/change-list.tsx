/** Changes as sentences, in the order in which they concern one. */
export function ChangeList({ changes }: { readonly changes: readonly string[] }) {
  return (
    <ul className="flex flex-col gap-2">
      {changes.map((change) => (
        <li key={change} className="border-l-4 border-ember pl-3 text-15">
          {change}
        </li>
      ))}
    </ul>
  );
}
