import { LinkButton } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export const metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <main id="main" className="px-6 py-16">
      <h1 className="sr-only">Not found</h1>
      <EmptyState title="There is nothing here that you can see">
        <p>The page may have been deleted, or it belongs to a trip that you are not on.</p>
        <LinkButton href="/trips">To your trips</LinkButton>
      </EmptyState>
    </main>
  );
}
