import { HttpClient } from '@angular/common/http';
import { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { answerNothing, answerProblem } from '../testing/problem-answer';
import { provideHttpForSpec } from '../testing/provide-http';
import { ConnectionStore } from './connection-store';
import { CsrfToken } from './csrf-token';
import { ProblemError } from './problem-error';

describe('requests', () => {
  let http: HttpClient;
  let server: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpForSpec()] });
    http = TestBed.inject(HttpClient);
    server = TestBed.inject(HttpTestingController);
  });

  afterEach(() => server.verify());

  /** What the request fails with. */
  function failureOf(path: string): { error?: unknown } {
    const failure: { error?: unknown } = {};
    http.get(path).subscribe({ error: (error: unknown) => (failure.error = error) });
    return failure;
  }

  it('fail with what the problem document says', () => {
    const failure = failureOf('/api/designs');
    answerProblem(server.expectOne('/api/designs'), 400, 'invalid-request', {
      detail: 'One field is not as it should be.',
      issues: [{ pointer: '/email', code: 'invalid-format', message: 'No address.' }],
    });
    const problem = failure.error as ProblemError;
    expect(problem).toBeInstanceOf(ProblemError);
    expect([problem.status, problem.code, problem.isOffline]).toEqual([400, 'invalid-request', false]);
    expect(problem.issueAt('/email')).toBe('No address.');
    expect(problem.issueAt('/name')).toBeUndefined();
  });

  it('tell a line that is down from a server that fails', () => {
    const connection = TestBed.inject(ConnectionStore);
    const down = failureOf('/api/designs');
    answerNothing(server.expectOne('/api/designs'));
    expect((down.error as ProblemError).isOffline).toBeTrue();
    expect(connection.isOnline()).toBeFalse();

    const gateway = failureOf('/api/designs');
    server.expectOne('/api/designs').flush('Bad gateway', { status: 502, statusText: 'Bad Gateway' });
    expect((gateway.error as ProblemError).isOffline).toBeTrue();

    const failing = failureOf('/api/designs');
    answerProblem(server.expectOne('/api/designs'), 503, 'storage-unavailable');
    const problem = failing.error as ProblemError;
    expect([problem.isOffline, problem.isPassing]).toEqual([false, true]);
    expect(connection.isOnline()).toBeTrue();
  });

  it('that change something carry the token, fetched once', () => {
    http.post('/api/designs', {}).subscribe();
    http.delete('/api/designs/1').subscribe();
    server.expectOne('/api/auth/csrf').flush({ token: 'first' });
    for (const path of ['/api/designs', '/api/designs/1']) {
      const request = server.expectOne(path);
      expect(request.request.headers.get('x-csrf-token')).toBe('first');
      request.flush({});
    }
    http.get('/api/designs').subscribe();
    expect(server.expectOne('/api/designs').request.headers.has('x-csrf-token')).toBeFalse();
  });

  it('are sent once more with a new token when theirs is outdated', () => {
    let answer: unknown;
    http.post('/api/designs', {}).subscribe((body) => (answer = body));
    server.expectOne('/api/auth/csrf').flush({ token: 'old' });
    answerProblem(server.expectOne('/api/designs'), 403, 'csrf-token');
    server.expectOne('/api/auth/csrf').flush({ token: 'new' });
    const again = server.expectOne('/api/designs');
    expect(again.request.headers.get('x-csrf-token')).toBe('new');
    again.flush({ id: '1' });
    expect(answer).toEqual({ id: '1' });
  });

  it('are not sent for ever: a second refusal is the answer', () => {
    let failure: unknown;
    http.post('/api/designs', {}).subscribe({ error: (error: unknown) => (failure = error) });
    for (const token of ['one', 'two']) {
      server.expectOne('/api/auth/csrf').flush({ token });
      answerProblem(server.expectOne('/api/designs'), 403, 'csrf-token');
    }
    expect((failure as ProblemError).code).toBe('csrf-token');
  });

  it('ask for the token again after it could not be had', () => {
    let failure: unknown;
    http.post('/api/designs', {}).subscribe({ error: (error: unknown) => (failure = error) });
    answerNothing(server.expectOne('/api/auth/csrf'));
    expect((failure as ProblemError).isOffline).toBeTrue();
    let token: string | undefined;
    TestBed.inject(CsrfToken)
      .get()
      .subscribe((value) => (token = value));
    server.expectOne('/api/auth/csrf').flush({ token: 'now' });
    expect(token).toBe('now');
  });
});
