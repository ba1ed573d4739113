import { renderLetter, type RenderedMail } from "../letter";

export function renderReminderMail(view: {
  readonly name: string;
  readonly tripName: string;
  readonly dates: string;
  /** "12 June 2027" */
  readonly answerBy: string | null;
  readonly isNewLink: boolean;
  readonly url: string;
}): RenderedMail {
  const until = view.answerBy ? ` The last day for an answer is ${view.answerBy}.` : "";
  return renderLetter({
    subject: `Do you come along: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      `the leader of “${view.tripName}” (${view.dates}) is waiting for your answer: yes, maybe or no.${until}`,
    ],
    link: { label: "Answer", url: view.url },
    footnotes: [
      ...(view.isNewLink ? ["This link takes the place of the one you had. It is for you alone."] : []),
      "An answer to this mail goes to the leader.",
    ],
  });
}

export function renderPlaceMail(view: {
  readonly name: string;
  readonly tripName: string;
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: `You have a place: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      `a place on “${view.tripName}” has become free, and it is yours. If you can't come any more, say so soon: somebody else may be waiting.`,
    ],
    link: { label: "To your answer", url: view.url },
    footnotes: ["An answer to this mail goes to the leader."],
  });
}

export function renderCallOffMail(view: {
  readonly name: string;
  readonly leaderName: string;
  readonly tripName: string;
  readonly dates: string;
  readonly isOff: boolean;
  readonly message: string;
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: view.isOff ? `Called off: ${view.tripName}` : `Takes place after all: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      view.isOff
        ? `${view.leaderName} has called off “${view.tripName}” (${view.dates}). The file takes it out of your calendar.`
        : `“${view.tripName}” (${view.dates}) takes place after all. The file puts it back into your calendar.`,
      ...(view.message ? [view.message] : []),
    ],
    link: { label: "To the trip", url: view.url },
    footnotes: [`Sent for ${view.leaderName}. An answer goes to them.`],
  });
}

export function renderDigestMail(view: {
  readonly name: string;
  readonly tripName: string;
  readonly lines: readonly string[];
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: `What is new: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [`since the last word of “${view.tripName}”:\n${view.lines.map((line) => `– ${line}`).join("\n")}`],
    link: { label: "To the trip", url: view.url },
    footnotes: ["At most one such mail a day for each trip, and none after it."],
  });
}
