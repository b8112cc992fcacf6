import { HttpClient } from '@angular/common/http';
import { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { DRAFT_SHELVES, memoryShelf } from '../drafts/draft-shelf';
import { answerNothing, answerProblem } from '../testing/problem-answer';
import { provideHttpForSpec } from '../testing/provide-http';
import type { SignedIn } from './auth-api';
import { SessionStore } from './session-store';

const ME: SignedIn = {
  account: { id: 'a', name: 'Ada', email: 'ada@forge.example' },
  shops: [{ id: 's', name: 'Ada’s shop', role: 'owner' }],
};

describe('SessionStore', () => {
  let session: SessionStore;
  let server: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpForSpec(),
        { provide: DRAFT_SHELVES, useValue: () => Promise.resolve(memoryShelf()) },
      ],
    });
    session = TestBed.inject(SessionStore);
    server = TestBed.inject(HttpTestingController);
  });

  afterEach(() => server.verify());

  it('asks once who is signed in', () => {
    session.load();
    session.load();
    expect(session.state().status).toBe('loading');
    server.expectOne('/api/auth/session').flush({ signedIn: ME });
    session.load();
    expect(session.state()).toEqual({ status: 'member', ...ME });
    expect(session.account()?.name).toBe('Ada');
  });

  it('knows a visitor from a server that could not say, and asks that one again', () => {
    session.load();
    answerNothing(server.expectOne('/api/auth/session'));
    expect(session.state().status).toBe('failed');
    session.load();
    server.expectOne('/api/auth/session').flush({ signedIn: null });
    expect(session.state().status).toBe('visitor');
  });

  it('takes a new token after signing in, since the session is a new one', () => {
    session.signIn({ email: 'ada@forge.example', password: 'three hammers' }).subscribe();
    server.expectOne('/api/auth/csrf').flush({ token: 'visitor' });
    server.expectOne('/api/auth/login').flush(ME);
    expect(session.state().status).toBe('member');

    session.signOut().subscribe();
    server.expectOne('/api/auth/csrf').flush({ token: 'member' });
    const request = server.expectOne('/api/auth/logout');
    expect(request.request.headers.get('x-csrf-token')).toBe('member');
    request.flush(null, { status: 204, statusText: 'No Content' });
    expect(session.state().status).toBe('visitor');
  });

  it('stays signed in while signing out fails', () => {
    session.load();
    server.expectOne('/api/auth/session').flush({ signedIn: ME });
    let hasFailed = false;
    session.signOut().subscribe({ error: () => (hasFailed = true) });
    server.expectOne('/api/auth/csrf').flush({ token: 'member' });
    answerNothing(server.expectOne('/api/auth/logout'));
    expect([hasFailed, session.state().status]).toEqual([true, 'member']);
  });

  it('ends when any answer says that nobody is signed in', () => {
    session.load();
    server.expectOne('/api/auth/session').flush({ signedIn: ME });
    TestBed.inject(HttpClient)
      .get('/api/designs')
      .subscribe({ error: () => undefined });
    answerProblem(server.expectOne('/api/designs'), 401, 'sign-in-required');
    expect(session.state().status).toBe('visitor');
  });
});
