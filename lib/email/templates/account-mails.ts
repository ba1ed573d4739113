import { renderLetter, type RenderedMail } from "../letter";

interface ToPerson {
  readonly name: string;
  readonly url: string;
}

export function renderVerificationMail({ name, url }: ToPerson): RenderedMail {
  return renderLetter({
    subject: "Confirm your e-mail address for Leestead",
    greeting: `Hello ${name},`,
    paragraphs: [
      "somebody, most likely you, has made an account at Leestead with this address. Confirm it to sign in.",
    ],
    link: { label: "Confirm this address", url },
    footnotes: ["The link works for 24 hours. If it was not you, do nothing: without it nobody can use the account."],
  });
}

export function renderResetMail({ name, url }: ToPerson): RenderedMail {
  return renderLetter({
    subject: "Choose a new password for Leestead",
    greeting: `Hello ${name},`,
    paragraphs: ["you asked for a new password. Choose one with this link."],
    link: { label: "Choose a new password", url },
    footnotes: [
      "The link works for one hour and once. Choosing a new password signs you out everywhere.",
      "If you did not ask, do nothing: your password stays as it is.",
    ],
  });
}

/** Instead of telling a stranger on the screen that the address has an account. */
export function renderExistingAccountMail({ name, url }: ToPerson): RenderedMail {
  return renderLetter({
    subject: "You already have an account at Leestead",
    greeting: `Hello ${name},`,
    paragraphs: [
      "somebody, most likely you, tried to make an account with this address. You have one already: sign in with it, or choose a new password there.",
    ],
    link: { label: "Sign in", url },
    footnotes: ["If it was not you, do nothing: nothing has changed."],
  });
}

export function renderSignInLinkMail({ name, url }: ToPerson): RenderedMail {
  return renderLetter({
    subject: "Your link to sign in to Leestead",
    greeting: `Hello ${name},`,
    paragraphs: ["you asked for a link to sign in. Open it on the device that you want to use."],
    link: { label: "Sign in", url },
    footnotes: ["The link works for 15 minutes and once. If you did not ask, do nothing: nobody is signed in."],
  });
}
