import { TestBed } from '@angular/core/testing';
import { deleteDB } from 'idb';
import { designNamed } from '../testing/designs';
import type { Draft } from './draft';
import { DRAFT_SHELVES, databaseShelf, type DraftShelf, memoryShelf } from './draft-shelf';
import { DraftStore } from './draft-store';

const DATABASE = 'layerwright-draft-store-spec';

function draft(key: string, name: string, savedAt = '2026-03-01T08:00:00.000Z'): Draft {
  return { key, document: designNamed(name), history: null, base: null, savedAt };
}

/** A store as a freshly loaded page has it. */
function freshStore(open: () => Promise<DraftShelf>): DraftStore {
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({ providers: [{ provide: DRAFT_SHELVES, useValue: open }] });
  return TestBed.inject(DraftStore);
}

describe('DraftStore', () => {
  const opened: (DraftShelf & { close(): void })[] = [];
  const openDatabase = async () => {
    const shelf = await databaseShelf(DATABASE);
    opened.push(shelf);
    return shelf;
  };

  afterEach(async () => {
    for (const shelf of opened.splice(0)) shelf.close();
    await deleteDB(DATABASE);
  });

  it('keeps drafts through a reload, newest first', async () => {
    const before = freshStore(openDatabase);
    expect(before.keeping()).toBe('opening');
    expect(await before.put(draft('visitor', 'First', '2026-03-01T08:00:00.000Z'))).toBeTrue();
    await before.put(draft('d1', 'Second', '2026-03-02T08:00:00.000Z'));

    const after = freshStore(openDatabase);
    expect((await after.get('visitor'))?.document.name).toBe('First');
    expect((await after.list()).map(({ key }) => key)).toEqual(['d1', 'visitor']);
    expect(after.keeping()).toBe('kept');
    await after.remove('d1');
    expect(await after.get('d1')).toBeUndefined();
  });

  it('keeps undo, and what its entries share stays shared', async () => {
    const present = designNamed('Now');
    const past = [
      { ...present, name: 'Before' },
      { ...present, name: 'Later' },
    ];
    const store = freshStore(openDatabase);
    await store.put({ ...draft('d1', ''), document: present, history: { past, future: [] } });
    const back = await freshStore(openDatabase).get('d1');
    expect(back?.history?.past.map(({ name }) => name)).toEqual(['Before', 'Later']);
    expect(back?.history?.past[0]?.bars).toBe(back?.document.bars);
  });

  it('takes away the copies of saved designs and nothing else', async () => {
    const store = freshStore(openDatabase);
    await store.put({ ...draft('d1', 'Saved'), base: { revision: 3, etag: '"3"' }, isSaved: true });
    await store.put({ ...draft('d2', 'Changed'), base: { revision: 3, etag: '"3"' } });
    await store.put(draft('visitor', 'Visitor’s'));
    await store.removeSaved();
    expect((await store.list()).map(({ key }) => key).sort()).toEqual(['d2', 'visitor']);
  });

  it('says so and goes on in memory where the database is closed', async () => {
    const store = freshStore(() => Promise.reject(new Error('closed')));
    expect(await store.get('visitor')).toBeUndefined();
    expect(store.keeping()).toBe('memory');
    expect(await store.put(draft('visitor', 'Only here'))).toBeFalse();
    expect((await store.get('visitor'))?.document.name).toBe('Only here');
    expect((await store.list()).length).toBe(1);
    await store.remove('visitor');
    expect(await store.get('visitor')).toBeUndefined();
  });

  it('does not trust a database that forgets what it was given', async () => {
    const forgetful = { ...memoryShelf(), put: () => Promise.resolve() };
    const store = freshStore(() => Promise.resolve(forgetful));
    expect(await store.put(draft('visitor', 'Kept anyway'))).toBeFalse();
    expect(store.keeping()).toBe('memory');
    expect((await store.get('visitor'))?.document.name).toBe('Kept anyway');
  });

  it('comes back to the database when that takes drafts again', async () => {
    let isFull = true;
    const shelf = memoryShelf();
    const store = freshStore(() =>
      Promise.resolve({
        ...shelf,
        put: (given: Draft) => (isFull ? Promise.reject(new Error('full')) : shelf.put(given)),
      }),
    );
    await store.put(draft('visitor', 'While full'));
    isFull = false;
    expect(await store.put(draft('visitor', 'After'))).toBeTrue();
    expect(store.keeping()).toBe('kept');
    expect((await store.list()).map(({ document }) => document.name)).toEqual(['After']);
  });
});
