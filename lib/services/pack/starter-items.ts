/** What everybody's list starts with; the leader changes it to suit. */
export const STARTER_PACK_ITEMS: readonly string[] = [
  "Sleeping bag",
  "Sleeping mat",
  "Head torch and spare battery",
  "Waterproof jacket and trousers",
  "Warm layer for camp",
  "Hat and gloves",
  "Spare socks",
  "Walking boots",
  "Water bottle",
  "Mug, bowl and spoon",
  "Knife",
  "Wash things and towel",
  "Own medicines",
  "Whistle",
  "Map of the route",
  "Rubbish bag",
];
