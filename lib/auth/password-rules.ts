export const PASSWORD_MIN = 8;
export const PASSWORD_MAX = 128;

let common: Promise<ReadonlySet<string>> | undefined;

/** Loaded at the first use: some 49,000 words that only sign-up and password changes need. */
async function loadCommonPasswords(): Promise<ReadonlySet<string>> {
  const { dictionary } = await import("@zxcvbn-ts/language-common");
  const words: readonly unknown[] = dictionary["passwords-common"];
  return new Set(words.filter((word): word is string => typeof word === "string" && word.length >= PASSWORD_MIN));
}

/** Why a password is refused, or null. Length is the only rule of form; what everybody tries first is refused too. */
export async function findPasswordFault(password: string, email?: string): Promise<string | null> {
  if ([...password].length < PASSWORD_MIN) return `Use at least ${PASSWORD_MIN} characters; 15 or more are better.`;
  if (password.length > PASSWORD_MAX) return `Use at most ${PASSWORD_MAX} characters.`;
  const plain = password.toLowerCase();
  common ??= loadCommonPasswords();
  if ((await common).has(plain) || new Set(plain).size < 3) {
    return "This password is one of those that are tried first. Choose another, for example four words in a row.";
  }
  if (email && plain === email.trim().toLowerCase()) return "Your address is not a password. Choose another.";
  return null;
}
