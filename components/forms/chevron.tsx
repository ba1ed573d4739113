/** Turns when the details around it (class "group") are open. */
export function Chevron() {
  return (
    <svg
      width="14"
      height="14"
      viewBox="0 0 14 14"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.8"
      className="shrink-0 group-open:rotate-90"
    >
      <path d="m5 2.5 4.5 4.5L5 11.5" strokeLinecap="round" strokeLinejoin="round" />
    </svg>
  );
}
