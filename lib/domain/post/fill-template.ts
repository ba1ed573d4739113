/** Words in braces that each mail fills for its own recipient. */
export const TEMPLATE_WORDS = [
  { word: "{name}", means: "name of the recipient" },
  { word: "{trip}", means: "name of the trip" },
  { word: "{dates}", means: "its days" },
  { word: "{leader}", means: "your name" },
  { word: "{link}", means: "address of the trip's page" },
] as const;

export interface TemplateValues {
  readonly name: string;
  readonly trip: string;
  readonly dates: string;
  readonly leader: string;
  readonly link: string;
}

/** Each word once: what is filled in is never filled again. Words that are none of ours stay as they stand. */
export function fillTemplate(text: string, values: TemplateValues): string {
  return text.replace(/\{(name|trip|dates|leader|link)\}/g, (_, key: keyof TemplateValues) => values[key]);
}

export interface TemplateView {
  /** Null: one of ours, the same for every trip. */
  readonly id: string | null;
  readonly name: string;
  readonly subject: string;
  readonly body: string;
}

export const OUR_TEMPLATES: readonly TemplateView[] = [
  {
    id: null,
    name: "Before the trip",
    subject: "{trip}: what to bring and where to be",
    body: "Hello {name},\n\n{trip} ({dates}) is near. Your list and the cards of your shelters come with this mail. Look through them, and tell me what is missing.\n\n{leader}",
  },
  {
    id: null,
    name: "The plan has changed",
    subject: "{trip}: the plan has changed",
    body: "Hello {name},\n\nsomething that concerns you has changed. The newest state is here: {link}. Please put the old paper away.\n\n{leader}",
  },
  {
    id: null,
    name: "Contact and health notes",
    subject: "{trip}: whom do we call for you",
    body: "Hello {name},\n\nplease write down whom to call in an emergency and what we have to know about your health: {link}/details. Only the co-leaders and I can read it.\n\n{leader}",
  },
  {
    id: null,
    name: "Weather on the way",
    subject: "{trip}: wind is coming",
    body: "Hello {name},\n\nstrong wind is forecast for {dates}. Check the lines and bring every anchor on your list. If we leave earlier or stay home, I write again.\n\n{leader}",
  },
];
