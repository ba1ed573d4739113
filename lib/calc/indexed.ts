/** The item at an index that must be there. Throws RangeError when it is not: never a silent stand-in. */
export function itemAt<T>(items: ArrayLike<T>, index: number): T {
  const item = items[index];
  if (item === undefined) throw new RangeError(`No item ${index} of ${items.length}.`);
  return item;
}
