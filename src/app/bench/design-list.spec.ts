import { HttpTestingController, type TestRequest } from '@angular/common/http/testing';
import type { HarnessLoader } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import { MatSnackBarHarness } from '@angular/material/snack-bar/testing';
import { provideRouter } from '@angular/router';
import { DraftStore } from '../core/drafts/draft-store';
import { DRAFT_SHELVES, memoryShelf } from '../core/drafts/draft-shelf';
import { CsrfToken } from '../core/http/csrf-token';
import { provideIcons } from '../core/icons/provide-icons';
import { SHELL_ICONS } from '../core/icons/shell-icons';
import { READER_LOCALE } from '../core/settings/reader-locale';
import { LOCAL_STORAGE } from '../core/settings/settings';
import { designBody, designNamed, listed } from '../core/testing/designs';
import { answerNothing, answerProblem } from '../core/testing/problem-answer';
import { provideHttpForSpec } from '../core/testing/provide-http';
import { UnitsStore } from '../core/units/units-store';
import { BENCH_ICONS } from './bench-icons';
import { DesignList } from './design-list';
import { KeptHere } from './kept-here';
import { DesignCardHarness } from './testing/design-card-harness';

const THREE = [
  listed('d1', 'Kitchen knife', '2026-03-01T08:00:00.000Z'),
  listed('d2', 'Señor’s seax', '2026-03-03T08:00:00.000Z'),
  listed('d3', 'Kitchen cleaver', '2026-03-02T08:00:00.000Z'),
];

describe('DesignList', () => {
  let fixture: ComponentFixture<DesignList>;
  let loader: HarnessLoader;
  let server: HttpTestingController;

  beforeEach(() => {
    const shelf = memoryShelf();
    TestBed.configureTestingModule({
      providers: [
        provideHttpForSpec(),
        provideRouter([{ path: '**', children: [] }]),
        provideIcons({ ...SHELL_ICONS, ...BENCH_ICONS }),
        { provide: DRAFT_SHELVES, useValue: () => Promise.resolve(shelf) },
        { provide: READER_LOCALE, useValue: 'en-GB' },
        { provide: LOCAL_STORAGE, useValue: null },
      ],
    });
    server = TestBed.inject(HttpTestingController);
    TestBed.inject(CsrfToken).get().subscribe();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    fixture = TestBed.createComponent(DesignList);
    loader = TestbedHarnessEnvironment.documentRootLoader(fixture);
  });

  const request = (method: string, path: string): TestRequest => server.expectOne({ method, url: path });
  const answerList = (designs: unknown) => request('GET', '/api/designs').flush(designs as object);
  const cards = () => loader.getAllHarnesses(DesignCardHarness);
  const names = async () => Promise.all((await cards()).map((card) => card.name()));

  it('shows the designs, the last changed first, with figures in the reader’s units', async () => {
    answerList(THREE);
    expect(await names()).toEqual(['Señor’s seax', 'Kitchen cleaver', 'Kitchen knife']);
    const [card] = await cards();
    expect(await card?.figures()).toEqual(['52', '990 g', '742 g']);
    TestBed.inject(UnitsStore).choose('inch');
    // 0.99 kg ÷ 0.45359237 kg = 2.18 lb
    expect((await card?.figures())?.[1]).toContain('2.18');
  });

  it('finds by every word, whatever the case and the accents, and sorts by name', async () => {
    answerList(THREE);
    const search = await loader.getHarness(MatInputHarness.with({ selector: '[type="search"]' }));
    await search.setValue('senor SEAX');
    expect(await names()).toEqual(['Señor’s seax']);
    await search.setValue('kitchen');
    const order = await loader.getHarness(MatSelectHarness);
    await order.clickOptions({ text: 'Name' });
    expect(await names()).toEqual(['Kitchen cleaver', 'Kitchen knife']);
    await search.setValue('axe');
    expect(await names()).toEqual([]);
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Show all' }))).click();
    expect((await names()).length).toBe(3);
  });

  it('deletes at once, moves the focus on, and brings back on Undo', async () => {
    answerList(THREE);
    const [first] = await cards();
    await first?.press('Delete');
    expect(await names()).toEqual(['Kitchen cleaver', 'Kitchen knife']);
    expect(await (await cards())[0]?.isFocused()).toBeTrue();
    request('GET', '/api/designs/d2').flush(designBody('d2', designNamed('Señor’s seax')), {
      headers: { ETag: '"1-x"' },
    });
    const deletion = request('DELETE', '/api/designs/d2');
    expect(deletion.request.headers.get('If-Match')).toBe('"1-x"');
    deletion.flush(null, { status: 204, statusText: 'No Content' });

    const snackBar = await loader.getHarness(MatSnackBarHarness);
    expect(await snackBar.getMessage()).toContain('Señor’s seax');
    await snackBar.dismissWithAction();
    request('POST', '/api/designs/d2/restore').flush(designBody('d2', designNamed('Señor’s seax'), 3), {
      headers: { ETag: '"3-y"' },
    });
    answerList(THREE);
    expect((await names()).length).toBe(3);
  });

  it('shows again what the server did not delete, and says so', async () => {
    answerList(THREE);
    await (await cards())[0]?.press('Delete');
    answerProblem(request('GET', '/api/designs/d2'), 503, 'storage-unavailable');
    answerList(THREE);
    expect((await names()).length).toBe(3);
    expect(await (await loader.getHarness(MatSnackBarHarness)).getMessage()).toContain('Not deleted');
  });

  it('duplicates under a name of its own', async () => {
    answerList([listed('d1', 'Knife'), listed('d2', 'Knife (copy)')]);
    await (await cards())[0]?.press('Duplicate');
    request('GET', '/api/designs/d1').flush(designBody('d1', designNamed('Knife')), {
      headers: { ETag: '"1"' },
    });
    const created = request('POST', '/api/designs');
    expect(created.request.body.document.name).toBe('Knife (copy 2)');
    created.flush(designBody('d3', designNamed('Knife (copy 2)')), { headers: { ETag: '"1"' } });
    answerList([listed('d1', 'Knife'), listed('d2', 'Knife (copy)'), listed('d3', 'Knife (copy 2)')]);
    expect((await names()).length).toBe(3);
  });

  it('marks designs whose changes only this browser has, and lists them while the server is away', async () => {
    const base = { revision: 1, etag: '"1"' };
    const savedAt = '2026-03-04T08:00:00.000Z';
    const drafts = TestBed.inject(DraftStore);
    await drafts.put({ key: 'd1', document: designNamed('Kitchen knife'), history: null, base, savedAt });
    await TestBed.inject(KeptHere).load();
    answerList(THREE);
    const marked = await Promise.all((await cards()).map((card) => card.isUnsaved()));
    expect(marked).toEqual([false, false, true]);

    fixture.componentInstance['store'].load();
    answerNothing(request('GET', '/api/designs'));
    await fixture.whenStable();
    const link = (fixture.nativeElement as HTMLElement).querySelector('lw-kept-list a');
    expect(link?.getAttribute('href')).toBe('/designs/d1');
  });

  it('never takes a failure for an empty bench', async () => {
    answerProblem(request('GET', '/api/designs'), 500, 'internal-error');
    await fixture.whenStable();
    const text = (fixture.nativeElement as HTMLElement).textContent;
    expect(text).toContain('can’t be shown');
    expect(text).not.toContain('The bench is empty');
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Try again' }))).click();
    answerList([]);
    await fixture.whenStable();
    expect((fixture.nativeElement as HTMLElement).textContent).toContain('The bench is empty');
  });
});
