import type { CopyView } from "@/lib/domain/own-pages/views";
import { formatInstant } from "@/lib/format/days";

const WAYS = { printed: "Printed", sent: "Sent by mail" } as const;

/** "Printed version 3, now 5": what somebody holds in their hand, and whether it still says the right thing. */
export function CopyLine({
  copy,
  version,
  timeZone,
}: {
  readonly copy: CopyView;
  readonly version: number;
  readonly timeZone: string;
}) {
  const isOld = copy.changes.length > 0;
  return (
    <p className="text-15">
      {isOld && <strong className="text-ember">Old. </strong>}
      {WAYS[copy.way]} version {copy.version}
      {version !== copy.version && `, now ${version}`}
      <span className="text-pencil">
        {", "}
        {formatInstant(copy.at, timeZone)}
        {!isOld && version !== copy.version && ". Nothing on these pages has changed: the paper is still right"}
        {!isOld && version === copy.version && ". Up to date"}
      </span>
    </p>
  );
}
