import type { OwnLine, OwnNight, OwnPages, OwnPitch, OwnTieOut } from "./own-pages";

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function placeWords({ place }: Pick<OwnNight, "place">): string {
  if (place === null) return "not placed yet";
  return place === "outside" ? "outside" : `in ${place}`;
}

function compareNights(before: readonly OwnNight[], after: readonly OwnNight[]): string[] {
  const changes: string[] = [];
  for (const night of after) {
    const was = before.find((one) => one.day === night.day);
    if (!was) changes.push(`A night more: ${night.campName}.`);
    else if (was.campId !== night.campId) changes.push(`You camp at ${night.campName} instead of ${was.campName}.`);
    else if (was.place !== night.place) {
      const now = night.place === null ? "you have no place to sleep" : `you sleep ${placeWords(night)}`;
      changes.push(`${night.campName}: ${now} now. Before: ${placeWords(was)}.`);
    } else if (was.withNames.join("|") !== night.withNames.join("|")) {
      const names = night.withNames.join(", ");
      changes.push(`${night.campName}: ${names ? `you share with ${names} now` : "nobody shares your shelter now"}.`);
    }
  }
  for (const night of before) {
    if (!after.some((one) => one.day === night.day)) changes.push(`A night less: ${night.campName}.`);
  }
  return changes;
}

function compareLines(before: readonly OwnLine[], after: readonly OwnLine[], verb: "bring" | "carry"): string[] {
  const changes: string[] = [];
  for (const line of after) {
    const was = before.find((one) => one.key === line.key);
    if (!was) changes.push(`New to ${verb}: ${line.name}.`);
    else if (was.name !== line.name) changes.push(`${capital(verb)} ${line.name} instead of ${was.name}.`);
  }
  for (const line of before) {
    if (!after.some((one) => one.key === line.key)) changes.push(`No longer to ${verb}: ${line.name}.`);
  }
  return changes;
}

function compareTieOut(where: string, was: OwnTieOut, now: OwnTieOut): string[] {
  if (was.anchor === now.anchor && was.rigging === now.rigging) return [];
  const at = `${where}, tie-out ${now.number}`;
  if (now.anchor === null) return [`${at}: no anchor now. Before: ${was.anchor ?? "none"}.`];
  if (was.anchor !== now.anchor) return [`${at}: ${now.anchor} now. Before: ${was.anchor ?? "no anchor"}.`];
  return [`${at}: ${now.rigging} now. Before: ${was.rigging}.`];
}

function comparePitch(was: OwnPitch, now: OwnPitch): string[] {
  const where = `${now.campName}, ${now.name}`;
  const changes: string[] = [];
  if (was.headingDeg !== now.headingDeg) {
    changes.push(`${where}: turn the front to ${Math.round(now.headingDeg)}°. Before: ${Math.round(was.headingDeg)}°.`);
  }
  if (was.shape !== now.shape) changes.push(`${where}: pitched to other measures.`);
  if (was.place !== now.place) changes.push(`${now.campName}: other ground or wind is expected.`);
  for (const tieOut of now.tieOuts) {
    const before = was.tieOuts.find((one) => one.tieOutId === tieOut.tieOutId);
    if (before) changes.push(...compareTieOut(where, before, tieOut));
    else changes.push(`${where}: tie-out ${tieOut.number} is new.`);
  }
  if (was.spares !== now.spares) changes.push(`${now.campName}: other anchors are left over for softer ground.`);
  return changes;
}

/** What is different on somebody's pages, as sentences; none when the older paper still says the right thing. */
export function compareOwnPages(before: OwnPages, after: OwnPages): string[] {
  const changes = [
    ...compareNights(before.nights, after.nights),
    ...after.pitches.flatMap((now) => {
      const was = before.pitches.find((one) => one.pitchId === now.pitchId);
      return was ? comparePitch(was, now) : [];
    }),
    ...compareLines(before.carry, after.carry, "carry"),
    ...compareLines(before.bring, after.bring, "bring"),
  ];
  if (before.contacts.join("|") !== after.contacts.join("|")) changes.push("The people to call are others.");
  return [...new Set(changes)];
}
