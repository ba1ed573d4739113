/** However often it is used, nobody stays signed in longer than this. */
export const SESSION_MAX_DAYS = 30;

export function isSessionTooOld(createdAt: Date): boolean {
  return Date.now() - new Date(createdAt).getTime() > SESSION_MAX_DAYS * 86_400_000;
}
