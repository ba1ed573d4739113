import type { Contact } from "@/lib/domain/trip/schema";
import { renderLetter, type RenderedMail } from "../letter";

interface EmergencyMailView {
  readonly name: string;
  readonly leaderName: string;
  readonly tripName: string;
  readonly dates: string;
  readonly version: number;
  readonly dueBack: string;
  readonly timeZone: string;
  readonly people: readonly string[];
  readonly groupPhone: string;
  readonly nights: readonly string[];
  readonly meetingPoints: string;
  readonly wayOut: string;
  readonly steps: readonly {
    readonly at: string;
    readonly who: string;
    readonly phone: string;
    readonly action: string;
  }[];
  readonly contacts: readonly Contact[];
}

const list = (lines: readonly string[]) => lines.map((line) => `– ${line}`).join("\n");

export function renderEmergencyMail(view: EmergencyMailView): RenderedMail {
  const steps = view.steps.map(
    ({ at, who, phone, action }, index) =>
      `${index + 1}. ${at}: ${action} (${[who, phone].filter(Boolean).join(", ")})`,
  );
  return renderLetter({
    subject: `Emergency plan, version ${view.version}: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      `${view.leaderName} names you as the contact outside the group for “${view.tripName}” (${view.dates}). This is version ${view.version}; it takes the place of earlier ones.`,
      `The group is due back ${view.dueBack} (clock of ${view.timeZone}). If you have heard nothing by then:\n${steps.join("\n")}`,
      ...(view.groupPhone ? [`Telephone of the group: ${view.groupPhone}`] : []),
      `In the group (${view.people.length}): ${view.people.join(", ")}`,
      view.nights.length > 0 ? `Nights:\n${list(view.nights)}` : "The nights are not planned yet.",
      ...(view.meetingPoints ? [`Meeting points:\n${view.meetingPoints}`] : []),
      ...(view.wayOut ? [`Way out:\n${view.wayOut}`] : []),
      ...(view.contacts.length > 0
        ? [
            `To call:\n${list(view.contacts.map((one) => `${[one.name, one.note].filter(Boolean).join(", ")}: ${one.phone}`))}`,
          ]
        : []),
    ],
    footnotes: [
      "Please answer that you have read this: the answer goes to the leader.",
      "This program calls nobody by itself, and it does not know whether the group is safe.",
    ],
  });
}

export function renderBackSafelyMail(view: {
  readonly name: string;
  readonly leaderName: string;
  readonly tripName: string;
}): RenderedMail {
  return renderLetter({
    subject: `Everybody is back: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      `${view.leaderName} says that the group of “${view.tripName}” is back. You need to call nobody. Thank you for keeping watch.`,
    ],
    footnotes: ["An answer to this mail goes to the leader."],
  });
}
