import { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { CsrfToken } from '../http/csrf-token';
import { designBody, designNamed } from '../testing/designs';
import { answerNothing, answerProblem } from '../testing/problem-answer';
import { provideHttpForSpec } from '../testing/provide-http';
import { DesignsApi, type SaveResult, type StoredDesign } from './designs-api';

describe('DesignsApi', () => {
  let api: DesignsApi;
  let server: HttpTestingController;
  const document = designNamed('Paring knife');

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpForSpec()] });
    api = TestBed.inject(DesignsApi);
    server = TestBed.inject(HttpTestingController);
    TestBed.inject(CsrfToken).get().subscribe();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
  });

  afterEach(() => server.verify());

  function save(): { result?: SaveResult } {
    const kept: { result?: SaveResult } = {};
    api.save('d 1', document, '"4-x"').subscribe((result) => (kept.result = result));
    return kept;
  }

  const putRequest = () => server.expectOne({ method: 'PUT', url: '/api/designs/d%201' });

  it('gives a design with the ETag that a save of it needs', () => {
    let design: StoredDesign | undefined;
    api.get('d1').subscribe((stored) => (design = stored));
    server.expectOne('/api/designs/d1').flush(designBody('d1', document, 4), { headers: { ETag: '"4-x"' } });
    expect([design?.etag, design?.revision, design?.document.name]).toEqual(['"4-x"', 4, 'Paring knife']);
  });

  it('saves over the named revision alone', () => {
    const kept = save();
    const request = putRequest();
    expect(request.request.headers.get('If-Match')).toBe('"4-x"');
    expect(request.request.body).toEqual({ document });
    request.flush(designBody('d 1', document, 5), { headers: { ETag: '"5-y"' } });
    expect(kept.result?.kind).toBe('saved');
    expect(kept.result?.kind === 'saved' && kept.result.design.etag).toBe('"5-y"');
  });

  for (const [kind, status, code] of [
    ['conflict', 412, 'stale-revision'],
    ['signed-out', 401, 'sign-in-required'],
    ['gone', 404, 'not-found'],
    ['refused', 400, 'invalid-request'],
    ['refused', 503, 'storage-unavailable'],
  ] as const) {
    it(`says ${kind} for ${code}`, () => {
      const kept = save();
      answerProblem(putRequest(), status, code);
      expect(kept.result?.kind).toBe(kind);
    });
  }

  it('says offline when there is no answer', () => {
    const kept = save();
    answerNothing(putRequest());
    expect(kept.result).toEqual({ kind: 'offline' });
  });
});
