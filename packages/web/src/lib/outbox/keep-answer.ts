import type { Kept } from './store.ts';
import { phone } from './store.ts';

type Item = Record<string, unknown>;

/**
 * Puts what the server answered to a press into the copies for a dead zone. The page that fetches them may not be open,
 * and without this a phone that loses its signal right after would show what was before the press.
 * @param name copies whose name begins like this
 * @param change gives the newer value, or null where the copy does not hold it
 */
export async function changeCopies(name: string, change: (value: Item) => Item | null): Promise<void> {
  const tx = (await phone()).transaction('copies', 'readwrite');
  for await (const cursor of tx.store.iterate(IDBKeyRange.bound(name, `${name}\uffff`))) {
    const { value, keptAt } = cursor.value as Kept<Item>;
    const newer = change(value);
    if (newer) await cursor.update({ value: newer, keptAt });
  }
  await tx.done;
}

/** The item that stands in a list of a copy, by the field that names it. */
export function inList(list: string, by: string, item: Item): (value: Item) => Item | null {
  return (value) => {
    const items = value[list] as Item[] | undefined;
    if (!items?.some((one) => one[by] === item[by])) return null;
    return { ...value, [list]: items.map((one) => (one[by] === item[by] ? item : one)) };
  };
}
