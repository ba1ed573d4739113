import type { ReactNode } from "react";

export function AuthHeading({ title, children }: { readonly title: string; readonly children?: ReactNode }) {
  return (
    <header className="mb-6">
      <h1 className="text-24 font-bold">{title}</h1>
      {children && <div className="mt-1 text-15 text-pencil">{children}</div>}
    </header>
  );
}
