import { TestBed } from '@angular/core/testing';
import { of, throwError } from 'rxjs';
import { DesignsApi } from '../designs/designs-api';
import { ProblemError } from '../http/problem-error';
import { designNamed } from '../testing/designs';
import { AdoptDrafts } from './adopt-drafts';
import { VISITOR_DRAFT } from './draft';
import { DRAFT_SHELVES, memoryShelf } from './draft-shelf';
import { DraftStore } from './draft-store';
import { VisitorDrafts } from './visitor-drafts';

describe('VisitorDrafts', () => {
  let visitor: VisitorDrafts;
  let store: DraftStore;
  let create: jasmine.Spy<DesignsApi['create']>;

  beforeEach(() => {
    const shelf = memoryShelf();
    create = jasmine
      .createSpy<DesignsApi['create']>('create')
      .and.callFake((document) =>
        of({ id: `id of ${document.name}`, revision: 1, etag: '"1"', updatedAt: '', document }),
      );
    TestBed.configureTestingModule({
      providers: [
        { provide: DRAFT_SHELVES, useValue: () => Promise.resolve(shelf) },
        { provide: DesignsApi, useValue: { create } },
      ],
    });
    visitor = TestBed.inject(VisitorDrafts);
    store = TestBed.inject(DraftStore);
  });

  const onTheAnvil = async () => (await store.get(VISITOR_DRAFT))?.document.name;
  const names = () => (visitor.drafts() ?? []).map(({ document }) => document.name).sort();

  it('lays aside what was at work when another is begun, and takes it up again', async () => {
    await visitor.start(designNamed('First'));
    await visitor.start(designNamed('Second'));
    expect(await onTheAnvil()).toBe('Second');
    expect(names()).toEqual(['First', 'Second']);

    const first = visitor.drafts()?.find(({ document }) => document.name === 'First');
    await visitor.takeUp(first?.key ?? '');
    expect(await onTheAnvil()).toBe('First');
    expect(names()).toEqual(['First', 'Second']);
  });

  it('brings a deleted draft back, beside what has taken its place', async () => {
    await visitor.start(designNamed('First'));
    const [first] = visitor.drafts() ?? [];
    await visitor.remove(VISITOR_DRAFT);
    expect(names()).toEqual([]);
    await visitor.start(designNamed('Second'));
    if (first) await visitor.putBack(first);
    expect(names()).toEqual(['First', 'Second']);
    expect(await onTheAnvil()).toBe('Second');
  });

  it('leaves unsaved work on stored designs alone', async () => {
    await store.put({ key: 'd1', document: designNamed('Stored'), history: null, base: null, savedAt: '1' });
    await visitor.load();
    expect(names()).toEqual([]);
  });

  it('gives all drafts to a new account and opens the one that was at work', async () => {
    await visitor.start(designNamed('First'));
    await visitor.start(designNamed('Second'));
    const adoption = await TestBed.inject(AdoptDrafts).adopt();
    expect(adoption).toEqual({ openId: 'id of Second', saved: 2, left: 0 });
    expect(names()).toEqual([]);
  });

  it('keeps in the browser what the server does not take', async () => {
    await visitor.start(designNamed('First'));
    create.and.returnValue(throwError(() => new ProblemError(0, 'offline', 'Down', undefined)));
    const adoption = await TestBed.inject(AdoptDrafts).adopt();
    expect(adoption).toEqual({ openId: undefined, saved: 0, left: 1 });
    expect(await onTheAnvil()).toBe('First');
  });
});
