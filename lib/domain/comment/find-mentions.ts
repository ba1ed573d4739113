import type { CommentMention } from "./schema";

interface Named {
  readonly id: string;
  readonly name: string;
}

const plain = (text: string) => text.normalize("NFC").toLowerCase();
const isLetter = (character: string | undefined) => character !== undefined && /[\p{L}\p{N}]/u.test(character);

/** "@Tobi Oduya", or "@Tobi" where only one person is called so. A longer word that begins alike is no mention. */
export function findMentions(body: string, people: readonly Named[]): CommentMention[] {
  const text = plain(body);
  const firstOf = ({ name }: Named) => plain(name).split(/\s+/)[0] ?? "";
  const isThere = (name: string): boolean => {
    const wanted = `@${name}`;
    for (let at = text.indexOf(wanted); at >= 0; at = text.indexOf(wanted, at + 1)) {
      if (!isLetter(text[at + wanted.length]) && !isLetter(text[at - 1])) return true;
    }
    return false;
  };
  return people
    .filter((one) => {
      const first = firstOf(one);
      const isOnlyOne = people.filter((other) => firstOf(other) === first).length === 1;
      return isThere(plain(one.name)) || (isOnlyOne && first !== "" && isThere(first));
    })
    .map(({ id, name }) => ({ personId: id, name }));
}
