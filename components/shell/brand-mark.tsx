/** A tarp in the lee: ridge line, two slopes, and one line drawn taut. */
export function BrandMark({ size = 28 }: { readonly size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 28 28" aria-hidden="true" fill="none" strokeLinecap="round">
      <path d="M3 23 13 7l9 16" stroke="currentColor" strokeWidth="2" strokeLinejoin="round" />
      <path d="M13 7v16" stroke="currentColor" strokeWidth="1.25" />
      <path d="m13 7 12 12.5" className="stroke-ember" strokeWidth="1.75" />
      <path d="M1.5 23h25" stroke="currentColor" strokeWidth="1.25" />
    </svg>
  );
}
