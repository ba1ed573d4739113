/** Faint contour-like lines of the sheet, the same each time. They carry no meaning. */
export function PaperLines({ width, height }: { readonly width: number; readonly height: number }) {
  const rows = Math.max(3, Math.round(height / 92));
  const step = 24;
  const paths = Array.from({ length: rows }, (_, row) => {
    const base = ((row + 0.55) * height) / rows;
    const points = Array.from({ length: Math.ceil(width / step) + 1 }, (_, column) => {
      const x = column * step;
      const y = base + 16 * Math.sin(x / 118 + row * 1.9) + 7 * Math.sin(x / 61 + row * 3.1);
      return `${x} ${y.toFixed(1)}`;
    });
    return `M${points.join("L")}`;
  });
  return <path d={paths.join("")} fill="none" className="stroke-hair" strokeWidth={1} strokeLinejoin="round" />;
}
