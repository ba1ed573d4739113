export const ROLES = ["leader", "co-leader", "participant"] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Readonly<Record<Role, string>> = {
  leader: "Leader",
  "co-leader": "Co-leader",
  participant: "Participant",
};

/** Who may do what on a trip. The server refuses by this table and the screen hides by it; there is no other. */
export const PERMISSIONS = {
  "trip.read": { sentence: "read the trip's programme", roles: ["leader", "co-leader", "participant"] },
  "trip.edit": { sentence: "change the trip's name, dates and notes", roles: ["leader"] },
  "trip.delete": { sentence: "delete the trip", roles: ["leader"] },
  "people.read": { sentence: "see who is on the trip and in which role", roles: ["leader", "co-leader"] },
  "people.edit": { sentence: "add people, change roles and send invitations", roles: ["leader"] },
  "answer.own": { sentence: "answer whether you come", roles: ["leader", "co-leader", "participant"] },
  "details.own": { sentence: "write your own contact and health notes", roles: ["leader", "co-leader", "participant"] },
  "contacts.read": { sentence: "read contacts, health notes and the emergency plan", roles: ["leader", "co-leader"] },
  "emergency.edit": { sentence: "write and send the emergency plan", roles: ["leader"] },
  "camp.read": { sentence: "see a camp's ground, wind and shelters", roles: ["leader", "co-leader"] },
  "camp.arrange": { sentence: "add, order, copy and delete camps", roles: ["leader"] },
  "camp.edit": { sentence: "change a camp's ground and wind", roles: ["leader", "co-leader"] },
  "route.read": { sentence: "see the route and its days", roles: ["leader", "co-leader"] },
  "route.edit": { sentence: "change the route and how the group walks", roles: ["leader"] },
  "shelter.edit": { sentence: "add and change shelters", roles: ["leader", "co-leader"] },
  "shelter.pitch": { sentence: "pitch shelters and place sleepers", roles: ["leader", "co-leader"] },
  "kit.edit": { sentence: "change the kit", roles: ["leader", "co-leader"] },
  "plan.read": { sentence: "see staking plans", roles: ["leader", "co-leader"] },
  "plan.edit": { sentence: "change staking plans", roles: ["leader", "co-leader"] },
  "pull-test.read": { sentence: "see pull tests and what they teach", roles: ["leader", "co-leader"] },
  "pull-test.edit": { sentence: "log and change pull tests", roles: ["leader", "co-leader"] },
  "paper.all": { sentence: "print every card and list", roles: ["leader", "co-leader"] },
  "paper.own": { sentence: "print your own cards and list", roles: ["leader", "co-leader", "participant"] },
  "pack.edit": { sentence: "change what people bring and carry", roles: ["leader", "co-leader"] },
  "load.own": { sentence: "say what you can carry", roles: ["leader", "co-leader", "participant"] },
  "pack.tick": { sentence: "tick off your own pack list", roles: ["leader", "co-leader", "participant"] },
  "history.read": { sentence: "see who changed what", roles: ["leader", "co-leader"] },
  "comment.read": { sentence: "read comments on camps and shelters", roles: ["leader", "co-leader"] },
  "comment.write": { sentence: "write comments on camps and shelters", roles: ["leader", "co-leader"] },
  "post.read": { sentence: "see messages and their state", roles: ["leader"] },
  "post.send": { sentence: "send cards and lists by e-mail", roles: ["leader"] },
} as const satisfies Record<string, { sentence: string; roles: readonly Role[] }>;

export type Permission = keyof typeof PERMISSIONS;

export function isAllowed(role: Role, permission: Permission): boolean {
  return (PERMISSIONS[permission].roles as readonly Role[]).includes(role);
}
