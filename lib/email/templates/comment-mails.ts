import { renderLetter, type RenderedMail } from "../letter";

/** To somebody who is called by name in a comment. */
export function renderMentionMail(view: {
  readonly name: string;
  readonly byName: string;
  readonly tripName: string;
  /** Name of the camp or shelter. */
  readonly about: string;
  readonly body: string;
  readonly url: string;
}): RenderedMail {
  return renderLetter({
    subject: `${view.about}: ${view.byName} wrote to you`.slice(0, 250),
    greeting: `Hello ${view.name},`,
    paragraphs: [`${view.byName} wrote about ${view.about} on the trip “${view.tripName}”:`, view.body],
    link: { label: "To the comments", url: view.url },
    footnotes: [`An answer to this mail goes to ${view.byName}.`],
  });
}
