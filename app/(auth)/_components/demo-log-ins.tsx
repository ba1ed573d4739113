import demo from "@/lib/domain/demo/people.json";

/** Only in the demo: who to sign in as. */
export function DemoLogIns() {
  return (
    <section className="mt-10 border-t border-hair pt-4">
      <h2 className="text-15 font-semibold">Demo log-ins</h2>
      <p className="text-13 text-pencil">
        Password for each: <code className="text-ink">{demo.password}</code>
      </p>
      <ul className="mt-2 text-13">
        {demo.people.map((one) => (
          <li key={one.email} className="flex flex-wrap justify-between gap-x-4 py-1">
            <code>{one.email}</code>
            <span className="text-pencil">{one.role}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}
