import Link from "next/link";
import type { TodoItem } from "@/lib/domain/views";

const BARS: Readonly<Record<TodoItem["tone"], string>> = {
  "gives-way": "border-rowan",
  thin: "border-ochre",
  unknown: "border-ember",
  people: "border-ember",
};

/** What stands between the plan and the trip, each with the page that settles it. */
export function BeforeYouGo({ items }: { readonly items: readonly TodoItem[] }) {
  return (
    <section aria-labelledby="before-you-go" className="mb-10">
      <h2 id="before-you-go" className="mb-3 text-18 font-bold">
        Before you go
      </h2>
      {items.length === 0 ? (
        <p className="border-t border-hair pt-3 text-15 text-pencil">Nothing is open. Print the cards or send them.</p>
      ) : (
        <ul>
          {items.map((item) => (
            <li key={`${item.href} ${item.title}`} className="border-t border-hair py-3">
              <Link href={item.href} className={`group block border-l-[3px] pl-3 ${BARS[item.tone]}`}>
                <span className="block text-15 font-bold">{item.title}</span>
                <span className="block text-15 font-semibold text-spruce group-hover:underline">{item.action}</span>
              </Link>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
