// The user's own parts on the shelf: kept one by one, so that no tab overwrites another's.

import { promisifyRequest } from 'idb-keyval';
import { beforeEach, expect, test } from 'vitest';
import { createPartShelf, openStore, randomId } from '../../src/storage/index.ts';
import type { PartShelf } from '../../src/storage/index.ts';
import { createTouchyStore, freshDisk } from './memory-surroundings.ts';

const J = 'J_in = n-JFET\n  I_DSS: 2 mA .. 6 mA at V_DS = 15 V  [data sheet, p. 2]\n  V_P: -3 V .. -1 V  [same]';
const M = 'M_out = p-MOSFET\n  V_TO: -2 V\n  K: 10 mA/V^2';
let time = 1000;
beforeEach(() => {
  freshDisk();
  time = 1000;
});
const shelfOf = (store = openStore()): PartShelf => createPartShelf({ store, now: () => time++, newId: randomId });

async function names(shelf: PartShelf): Promise<string[]> {
  const listed = await shelf.list();
  if ('fault' in listed) throw new Error(listed.fault.text);
  return listed.parts.map(({ name, kind }) => `${name} ${kind}`);
}

test('parts come back by name with their kind and text', async () => {
  const shelf = shelfOf();
  await shelf.keep(M);
  await shelf.keep(J);
  expect(await names(shelf)).toEqual(['J_in n-JFET', 'M_out p-MOSFET']);
  const listed = await shelf.list();
  expect('parts' in listed && listed.parts[0]!.text).toBe(J);
});

test('two tabs that keep at the same moment lose none', async () => {
  const [here, there] = [shelfOf(), shelfOf()];
  await Promise.all([...Array(10).keys()].map((k) => (k % 2 === 0 ? here : there).keep(J.replace('J_in', `J_${k}`))));
  expect(await names(here)).toHaveLength(10);
  expect(await names(there)).toEqual(await names(here));
});

test('a part is renamed in place, removed, and put back as it was', async () => {
  const shelf = shelfOf();
  const kept = await shelf.keep(J);
  if ('fault' in kept) throw new Error(kept.fault.text);
  await shelf.put({ ...kept.part, text: J.replace('J_in', 'J_low') });
  expect(await names(shelf)).toEqual(['J_low n-JFET']);
  expect(await shelf.remove(kept.part.id)).toEqual({ removed: true });
  expect(await names(shelf)).toEqual([]);
  await shelf.put(kept.part);
  expect(await names(shelf)).toEqual(['J_in n-JFET']);
});

test('what is damaged or of a newer version is passed over and stays', async () => {
  const shelf = shelfOf();
  await shelf.keep(J);
  await openStore()('readwrite', (objects) => {
    objects.put({ format: 2, id: 'x', text: J, kept: 1 }, ['part', 'x']);
    objects.put({ format: 1, id: 'y', text: 'R = 1 kohm', kept: 1 }, ['part', 'y']);
    objects.put('nothing', ['part', 'z']);
    return promisifyRequest<void>(objects.transaction);
  });
  expect(await names(shelf)).toEqual(['J_in n-JFET']);
  const left = await openStore()('readonly', (objects) => promisifyRequest<unknown[]>(objects.getAll()));
  expect(left).toHaveLength(4);
});

test('a full or refusing store is said in words and loses nothing', async () => {
  const touchy = createTouchyStore();
  const shelf = shelfOf(touchy.store);
  await shelf.keep(J);
  touchy.fault = 'full';
  const full = await shelf.keep(M);
  expect('fault' in full && full.fault.text).toBe(
    'Room for the part could not be made: storage is full. Everything else is safe. Make room on the shelf first.',
  );
  touchy.fault = 'refused';
  const refused = await shelf.keep(M);
  expect('fault' in refused && refused.fault.code).toBe('storage-refused');
  touchy.fault = 'none';
  expect(await names(shelf)).toEqual(['J_in n-JFET']);
});
