import { renderLetter, type RenderedMail } from "../letter";

export function renderInvitationMail(view: {
  readonly name: string;
  readonly inviterName: string;
  readonly tripName: string;
  readonly dates: string;
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: `Invitation: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      `${view.inviterName} has put you on the trip “${view.tripName}” (${view.dates}). With the link you join it: you see where you sleep, how your shelter is pitched and what you carry.`,
    ],
    link: { label: "Join the trip", url: view.url },
    footnotes: [
      "The link works for 14 days and once. It is for you alone: do not pass it on.",
      "If you do not know this trip, do nothing. An answer to this mail goes to the leader.",
    ],
  });
}

export function renderAddedMail(view: {
  readonly name: string;
  readonly inviterName: string;
  readonly tripName: string;
  readonly dates: string;
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: `You are on the trip: ${view.tripName}`,
    greeting: `Hello ${view.name},`,
    paragraphs: [`${view.inviterName} has put you on the trip “${view.tripName}” (${view.dates}). Sign in to see it.`],
    link: { label: "To the trip", url: view.url },
    footnotes: ["If you do not know this trip, do nothing. An answer to this mail goes to the leader."],
  });
}

/** Carries the papers; the words in the middle are the leader's. */
export function renderPapersMail(view: {
  readonly name: string;
  readonly leaderName: string;
  readonly tripName: string;
  readonly subject: string;
  readonly message: string;
  readonly fileNames: readonly string[];
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: view.subject,
    greeting: `Hello ${view.name},`,
    paragraphs: [
      ...(view.message ? [view.message] : []),
      ...(view.fileNames.length > 0
        ? [`With this mail for “${view.tripName}”:\n${view.fileNames.map((one) => `– ${one}`).join("\n")}`]
        : []),
    ],
    link: { label: "The newest state of the trip", url: view.url },
    footnotes: [
      `Sent for ${view.leaderName}. An answer goes to them.`,
      "A planning aid: estimates from typical ground. Test on site, do not rely on a shelter in a storm, leave in time.",
    ],
  });
}
