const VERBS: Readonly<Record<string, string>> = {
  create: "added",
  update: "changed",
  delete: "deleted",
  copy: "copied",
  reorder: "put in another order",
};

const THINGS: Readonly<Record<string, string>> = {
  trip: "the trip",
  camp: "a camp",
  route: "the route",
  shelter: "a shelter",
  pitch: "a pitch",
  sleepers: "the sleeping places",
  kit: "the kit",
  plan: "a staking plan",
  pack: "the packing",
  person: "a person",
  post: "a message",
  "pull-test": "a pull test",
  comment: "a comment",
};

/** "changed a staking plan". */
export function changeWords(action: string, entity: string): string {
  if (entity === "post" && action === "create") return "sent a message";
  if (entity === "comment" && action === "create") return "wrote a comment";
  return `${VERBS[action] ?? "changed"} ${THINGS[entity] ?? "something"}`;
}
