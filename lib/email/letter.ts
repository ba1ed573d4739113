/** A mail as parts, rendered to text and to plain HTML from the same words: no pictures, no trackers. */
export interface Letter {
  readonly subject: string;
  /** "Hello Ada," */
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  readonly link?: { readonly label: string; readonly url: string };
  /** After the link, in small print. */
  readonly footnotes: readonly string[];
}

export interface RenderedMail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

export function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}

const asLines = (text: string) => escapeHtml(text).replaceAll("\n", "<br>");

export function renderLetter(letter: Letter): RenderedMail {
  const { subject, greeting, paragraphs, link, footnotes } = letter;
  const text = [
    greeting,
    ...paragraphs,
    ...(link ? [`${link.label}:\n${link.url}`] : []),
    ["-- ", ...footnotes].join("\n"),
  ].join("\n\n");
  const row = (content: string, style: string) => `<tr><td style="${style}">${content}</td></tr>`;
  const body = "padding:0 0 16px;font:16px/1.5 sans-serif;color:#1f2a2c";
  const small = "padding:0 0 8px;font:13px/1.5 sans-serif;color:#5c686a";
  const rows = [
    row(asLines(greeting), body),
    ...paragraphs.map((one) => row(asLines(one), body)),
    ...(link
      ? [
          row(
            `<a href="${escapeHtml(link.url)}" style="color:#22584b;font-weight:bold">${escapeHtml(link.label)}</a>`,
            body,
          ),
          row(escapeHtml(link.url), small),
        ]
      : []),
    ...footnotes.map((one) => row(asLines(one), small)),
  ];
  const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head><body><table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="max-width:600px">${rows.join("")}</table></body></html>`;
  return { subject, text: `${text}\n`, html };
}
