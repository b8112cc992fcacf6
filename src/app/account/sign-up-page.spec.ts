import { HttpTestingController } from '@angular/common/http/testing';
import type { HarnessLoader } from '@angular/cdk/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { provideRouter, Router } from '@angular/router';
import { DRAFT_SHELVES, memoryShelf } from '../core/drafts/draft-shelf';
import { VisitorDrafts } from '../core/drafts/visitor-drafts';
import { provideIcons } from '../core/icons/provide-icons';
import { SessionStore } from '../core/session/session-store';
import { designBody, designNamed } from '../core/testing/designs';
import { answerNothing, answerProblem } from '../core/testing/problem-answer';
import { provideHttpForSpec } from '../core/testing/provide-http';
import { ACCOUNT_ICONS } from './account-icons';
import { SignUpPage } from './sign-up-page';

const ME = { account: { id: 'a', name: 'Ada', email: 'ada@forge.example' }, shops: [] };

describe('SignUpPage', () => {
  let fixture: ComponentFixture<SignUpPage>;
  let loader: HarnessLoader;
  let server: HttpTestingController;

  beforeEach(() => {
    const shelf = memoryShelf();
    TestBed.configureTestingModule({
      providers: [
        provideHttpForSpec(),
        provideRouter([{ path: '**', children: [] }]),
        provideIcons(ACCOUNT_ICONS),
        { provide: DRAFT_SHELVES, useValue: () => Promise.resolve(shelf) },
      ],
    });
    fixture = TestBed.createComponent(SignUpPage);
    loader = TestbedHarnessEnvironment.loader(fixture);
    server = TestBed.inject(HttpTestingController);
  });

  const field = (label: RegExp) => loader.getHarness(MatFormFieldHarness.with({ floatingLabelText: label }));

  async function fillIn(values: Readonly<Record<'name' | 'email' | 'password', string>>): Promise<void> {
    for (const [name, value] of Object.entries(values)) {
      const input = await loader.getHarness(MatInputHarness.with({ selector: `[name="${name}"]` }));
      await input.setValue(value);
    }
  }

  async function submit(): Promise<void> {
    await (await loader.getHarness(MatButtonHarness.with({ text: 'Make the account' }))).click();
  }

  const registration = () => server.expectOne('/api/auth/register');

  it('says beside each field what is missing, and sends nothing', async () => {
    await submit();
    for (const label of [/Name/, /E-mail/, /Password/]) {
      expect((await (await field(label)).getTextErrors()).join('')).not.toBe('');
    }
    server.verify();
  });

  it('explains what is not enough of a password or no address', async () => {
    await fillIn({ name: 'Ada', email: 'ada', password: 'short' });
    await submit();
    expect(await (await field(/E-mail/)).getTextErrors()).toEqual([jasmine.stringMatching('@')]);
    expect(await (await field(/Password/)).getTextErrors()).toEqual([jasmine.stringMatching('8 characters')]);
  });

  it('keeps what was typed when the address is taken, and leads to signing in', async () => {
    await fillIn({ name: 'Ada', email: 'ada@forge.example', password: 'three hammers' });
    await submit();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    answerProblem(registration(), 409, 'email-taken');
    await fixture.whenStable();
    const [error] = await (await field(/E-mail/)).getTextErrors();
    expect(error).toContain('There is an account');
    expect(error).toContain('Sign in instead');
    const email = await loader.getHarness(MatInputHarness.with({ selector: '[name="email"]' }));
    expect(await email.getValue()).toBe('ada@forge.example');
  });

  it('puts the server’s words beside the field they are about', async () => {
    await fillIn({ name: 'Ada', email: 'ada@forge.example', password: 'password1' });
    await submit();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    answerProblem(registration(), 400, 'invalid-request', {
      issues: [{ pointer: '/password', code: 'password-common', message: 'Take another.' }],
    });
    await fixture.whenStable();
    expect(await (await field(/Password/)).getTextErrors()).toEqual(['Take another.']);
  });

  it('can be sent again after a broken line', async () => {
    await fillIn({ name: ' Ada ', email: 'ada@forge.example', password: 'three hammers' });
    await submit();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    answerNothing(registration());
    await fixture.whenStable();
    await submit();
    const request = registration();
    expect(request.request.body.name).toBe('Ada');
    request.flush(ME, { status: 201, statusText: 'Created' });
    await fixture.whenStable();
    expect(TestBed.inject(SessionStore).account()?.name).toBe('Ada');
  });

  it('brings the visitor’s draft along and opens it', async () => {
    await TestBed.inject(VisitorDrafts).start(designNamed('Twelve heats'));
    const navigate = spyOn(TestBed.inject(Router), 'navigateByUrl').and.resolveTo(true);
    await fillIn({ name: 'Ada', email: 'ada@forge.example', password: 'three hammers' });
    await submit();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    registration().flush(ME, { status: 201, statusText: 'Created' });
    await fixture.whenStable();
    await new Promise((resolve) => setTimeout(resolve));
    server.expectOne('/api/auth/csrf').flush({ token: 'u' });
    const created = server.expectOne('/api/designs');
    expect(created.request.body.document.name).toBe('Twelve heats');
    created.flush(designBody('d7', designNamed('Twelve heats')), { headers: { ETag: '"1"' } });
    await new Promise((resolve) => setTimeout(resolve, 20));
    expect(navigate.calls.mostRecent().args[0]).toBe('/designs/d7');
    expect(TestBed.inject(VisitorDrafts).drafts()).toEqual([]);
  });

  it('lets the password be seen', async () => {
    const password = await loader.getHarness(MatInputHarness.with({ selector: '[name="password"]' }));
    expect(await password.getType()).toBe('password');
    await (
      await loader.getHarness(MatButtonHarness.with({ selector: '[aria-label="Show the password"]' }))
    ).click();
    expect(await password.getType()).toBe('text');
  });
});
