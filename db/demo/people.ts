import type { Role } from "@/lib/domain/permissions/permissions";

/** One for all of them; printed by the seed, good for a demo on one's own machine only. */
export const DEMO_PASSWORD = "four-lines-to-the-lee";

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  /** Without an account they have an invitation that is not answered yet. */
  readonly hasAccount: boolean;
}

/** Invented; the names come from several languages on purpose, so that cards show whether all letters are there. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { name: "Runa Amsel", email: "runa@leestead.example", role: "leader", hasAccount: true },
  { name: "Tobi Oduya", email: "tobi@leestead.example", role: "co-leader", hasAccount: true },
  { name: "Kirsi Lindqvist", email: "kirsi@leestead.example", role: "participant", hasAccount: true },
  { name: "Marco Ferrobello", email: "marco@leestead.example", role: "participant", hasAccount: true },
  { name: "Łucja Żółkoń", email: "lucja@leestead.example", role: "participant", hasAccount: true },
  { name: "Ігор Гайовий", email: "ihor@leestead.example", role: "participant", hasAccount: true },
  { name: "Junko Satomi", email: "junko@leestead.example", role: "participant", hasAccount: false },
  { name: "Amara Dialeu", email: "amara@leestead.example", role: "participant", hasAccount: false },
];

/** Leads the small trip that has only begun. */
export const SECOND_LEADER: DemoPerson = {
  name: "Nadia Brookhill",
  email: "nadia@leestead.example",
  role: "leader",
  hasAccount: true,
};
