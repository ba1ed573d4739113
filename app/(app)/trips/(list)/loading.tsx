import { PageSkeleton } from "@/components/trip/page-body";

export default function Loading() {
  return <PageSkeleton rows={3} />;
}
