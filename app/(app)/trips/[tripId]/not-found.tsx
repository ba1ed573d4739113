import { LinkButton } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/layout";

export default function TripPartNotFound() {
  return (
    <div className="px-4 py-10 sm:px-8">
      <h1 className="sr-only">Not found</h1>
      <EmptyState title="There is nothing here that you can see">
        <p>It may have been deleted, or your role on this trip does not include it.</p>
        <LinkButton href="/trips">To your trips</LinkButton>
      </EmptyState>
    </div>
  );
}
