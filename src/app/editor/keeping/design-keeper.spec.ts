import { TestBed } from '@angular/core/testing';
import { type Design, renameDesign } from '@shared/design';
import { firstValueFrom, type Observable, Subject, of } from 'rxjs';
import { DesignsApi, type SaveResult, type StoredDesign } from '../../core/designs/designs-api';
import type { Draft } from '../../core/drafts/draft';
import { type DraftShelf, memoryShelf } from '../../core/drafts/draft-shelf';
import { DesignStore } from '../design-store';
import { STRAIGHT } from '../testing/designs';
import { provideEditorForSpec } from '../testing/provide-editor';
import { DesignKeeper } from './design-keeper';
import { DraftWriter } from './draft-writer';

/** The server as the spec plays it: it notes every save and answers when told to. */
class PlayedServer {
  readonly saves: { document: Design; etag: string; answer: Subject<SaveResult> }[] = [];
  stored: StoredDesign = stored(STRAIGHT, 1);
  created: Design | undefined;

  save(_id: string, document: Design, etag: string): Observable<SaveResult> {
    const answer = new Subject<SaveResult>();
    this.saves.push({ document, etag, answer });
    return answer;
  }

  get(): Observable<StoredDesign> {
    return of(this.stored);
  }

  create(document: Design): Observable<StoredDesign> {
    this.created = document;
    return of({ ...stored(document, 1), id: 'copy' });
  }

  answer(result: SaveResult): void {
    const save = this.saves[this.saves.length - 1];
    save?.answer.next(result);
    save?.answer.complete();
    TestBed.tick();
  }
}

function stored(document: Design, revision: number): StoredDesign {
  return { id: 'd1', revision, etag: `"${revision}"`, updatedAt: '2026-03-01T08:30:00.000Z', document };
}

describe('DesignKeeper', () => {
  let server: PlayedServer;
  let store: DesignStore;
  let keeper: DesignKeeper;
  let shelf: DraftShelf;

  beforeEach(() => {
    jasmine.clock().install();
    jasmine.clock().mockDate(new Date('2026-03-01T09:00:00Z'));
    server = new PlayedServer();
    shelf = memoryShelf();
    TestBed.configureTestingModule({
      providers: [provideEditorForSpec(shelf), { provide: DesignsApi, useValue: server }],
    });
    store = TestBed.inject(DesignStore);
    keeper = TestBed.inject(DesignKeeper);
  });

  afterEach(() => jasmine.clock().uninstall());

  const rename = (name: string) => {
    store.edit((design) => renameDesign(design, name));
    TestBed.tick();
  };
  const wait = (ms: number) => {
    jasmine.clock().tick(ms);
    TestBed.tick();
  };
  const openSaved = () => {
    keeper.openStored(server.stored, undefined);
    TestBed.tick();
  };
  const kind = () => keeper.state().kind;
  const saved = (revision: number): SaveResult => ({
    kind: 'saved',
    design: stored(store.design(), revision),
  });
  const written = async (key = 'd1'): Promise<Draft | undefined> => {
    const idle = { yet: false };
    void TestBed.inject(DraftWriter)
      .idle()
      .then(() => (idle.yet = true));
    for (let i = 0; i < 100 && !idle.yet; i++) {
      jasmine.clock().tick(50);
      for (let turn = 0; turn < 30; turn++) await Promise.resolve();
    }
    return shelf.get(key);
  };

  it('saves within two seconds of the first change, however long the typing goes on', () => {
    openSaved();
    expect(kind()).toBe('saved');
    rename('A');
    expect(kind()).toBe('unsaved');
    for (let i = 0; i < 9; i++) {
      wait(200);
      rename(`A${i}`);
    }
    expect(server.saves.length).toBe(1);
    expect(server.saves[0]?.etag).toBe('"1"');
    expect(kind()).toBe('saving');
  });

  it('sends one save after the other, each over the revision before', () => {
    openSaved();
    rename('A');
    wait(1100);
    rename('B');
    wait(5000);
    expect(server.saves.length).withContext('the first is still under way').toBe(1);
    server.answer({ kind: 'saved', design: stored(server.saves[0]?.document as Design, 2) });
    wait(1100);
    expect(server.saves.map((save) => [save.document.name, save.etag])).toEqual([
      ['A', '"1"'],
      ['B', '"2"'],
    ]);
    server.answer(saved(3));
    expect(kind()).toBe('saved');
    wait(10_000);
    expect(server.saves.length).toBe(2);
  });

  it('writes every change into the draft at once, with its undo', async () => {
    openSaved();
    rename('A');
    const draft = await written();
    expect(draft?.document.name).toBe('A');
    expect(draft?.history?.past.map((design) => design.name)).toEqual([STRAIGHT.name]);
    expect(draft?.base?.etag).toBe('"1"');
    expect(draft?.isSaved).toBeFalse();
    expect(server.saves.length).toBe(0);
  });

  it('marks the draft as saved when it is', async () => {
    openSaved();
    rename('A');
    wait(1100);
    server.answer(saved(2));
    const draft = await written();
    expect([draft?.isSaved, draft?.base?.etag]).toEqual([true, '"2"']);
  });

  it('needs no save when a change is undone before its turn', () => {
    openSaved();
    rename('A');
    store.undo();
    TestBed.tick();
    wait(3000);
    expect(server.saves.length).toBe(0);
    expect(kind()).toBe('saved');
  });

  it('goes on after a killed tab: the draft is opened, with undo, and saved', () => {
    const mine = renameDesign(STRAIGHT, 'Mine');
    const draft: Draft = {
      key: 'd1',
      document: mine,
      history: { past: [STRAIGHT], future: [] },
      base: { revision: 1, etag: '"1"' },
      isSaved: false,
      savedAt: '2026-03-01T08:45:00.000Z',
    };
    keeper.openStored(server.stored, draft);
    TestBed.tick();
    expect(store.design().name).toBe('Mine');
    expect(server.saves.map((save) => save.document.name)).toEqual(['Mine']);
    store.undo();
    expect(store.design().name).toBe(STRAIGHT.name);
  });

  it('takes theirs, without undo into it, when nothing here was unsaved', () => {
    const theirs = stored(renameDesign(STRAIGHT, 'Theirs'), 7);
    const draft: Draft = {
      key: 'd1',
      document: STRAIGHT,
      history: { past: [renameDesign(STRAIGHT, 'Older')], future: [] },
      base: { revision: 1, etag: '"1"' },
      isSaved: true,
      savedAt: '2026-03-01T08:45:00.000Z',
    };
    keeper.openStored(theirs, draft);
    expect(store.design().name).toBe('Theirs');
    expect(store.canUndo()).toBeFalse();
    expect(kind()).toBe('saved');
  });

  it('keeps offline edits and saves them when the line is back', () => {
    openSaved();
    rename('A');
    wait(1100);
    server.answer({ kind: 'offline' });
    expect(kind()).toBe('offline');
    for (let i = 0; i < 10; i++) rename(`B${i}`);
    expect(kind()).toBe('offline');
    keeper.retry();
    expect(server.saves[server.saves.length - 1]?.document.name).toBe('B9');
    server.answer(saved(2));
    expect(kind()).toBe('saved');
  });

  describe('when someone saved in between', () => {
    const theirDocument = renameDesign(STRAIGHT, 'Theirs');

    beforeEach(() => {
      openSaved();
      rename('Mine');
      wait(1100);
      server.stored = stored(theirDocument, 5);
      server.answer({ kind: 'conflict', problem: undefined as never });
    });

    it('says so, with what they have, and saves nothing by itself', () => {
      const state = keeper.state();
      expect(state.kind === 'conflict' && state.theirs?.document.name).toBe('Theirs');
      rename('Mine 2');
      wait(10_000);
      expect(server.saves.length).toBe(1);
      expect(kind()).toBe('conflict');
    });

    it('keeps mine over theirs', () => {
      keeper.keepMine();
      expect(server.saves[1]?.etag).toBe('"5"');
      expect(server.saves[1]?.document.name).toBe('Mine');
    });

    it('keeps theirs, and undo does not take their work back', () => {
      keeper.keepTheirs();
      TestBed.tick();
      expect(store.design().name).toBe('Theirs');
      expect(store.canUndo()).toBeFalse();
      expect(kind()).toBe('saved');
      wait(5000);
      expect(server.saves.length).toBe(1);
    });

    it('keeps mine as a design of its own', async () => {
      const copy = await firstValueFrom(keeper.keepAsCopy('Mine (mine)'));
      expect(copy.id).toBe('copy');
      expect(server.created?.name).toBe('Mine (mine)');
      expect(await written()).toBeUndefined();
    });
  });

  it('sees no conflict in its own save whose answer was lost', () => {
    openSaved();
    rename('A');
    wait(1100);
    server.stored = stored(structuredClone(store.design()), 2);
    server.answer({ kind: 'conflict', problem: undefined as never });
    expect(kind()).toBe('saved');
    rename('B');
    wait(1100);
    expect(server.saves[1]?.etag).toBe('"2"');
  });

  it('stops saving what was deleted elsewhere', () => {
    openSaved();
    rename('A');
    wait(1100);
    server.answer({ kind: 'gone' });
    rename('B');
    wait(5000);
    expect(kind()).toBe('gone');
    expect(server.saves.length).toBe(1);
  });

  it('keeps a visitor’s design in the browser alone', async () => {
    keeper.openVisitor('visitor', STRAIGHT, null);
    TestBed.tick();
    rename('A');
    wait(5000);
    expect(server.saves.length).toBe(0);
    expect(keeper.designId()).toBeNull();
    expect((await written('visitor'))?.document.name).toBe('A');
  });
});
