import { HttpTestingController } from '@angular/common/http/testing';
import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { DRAFT_SHELVES } from '../drafts/draft-shelf';
import { DraftStore } from '../drafts/draft-store';
import { UnexpectedErrors } from '../errors/app-error-handler';
import { ConnectionStore } from '../http/connection-store';
import { provideIcons } from '../icons/provide-icons';
import { SHELL_ICONS } from '../icons/shell-icons';
import { SessionStore } from '../session/session-store';
import { LOCAL_STORAGE } from '../settings/settings';
import { answerNothing } from '../testing/problem-answer';
import { provideHttpForSpec } from '../testing/provide-http';
import { UnitsStore } from '../units/units-store';
import { Shell } from './shell';
import { ShellHarness } from './testing/shell-harness';

@Component({
  selector: 'lw-page-for-spec',
  template: '<h1>Page</h1>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class PageForSpec {}

describe('Shell', () => {
  let fixture: ComponentFixture<Shell>;
  let shell: ShellHarness;
  let server: HttpTestingController;

  beforeEach(async () => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpForSpec(),
        provideRouter([{ path: '**', component: PageForSpec }]),
        provideIcons(SHELL_ICONS),
        { provide: DRAFT_SHELVES, useValue: () => Promise.reject(new Error('closed')) },
        { provide: LOCAL_STORAGE, useValue: null },
      ],
    });
    fixture = TestBed.createComponent(Shell);
    shell = await TestbedHarnessEnvironment.harnessForFixture(fixture, ShellHarness);
    server = TestBed.inject(HttpTestingController);
    await TestBed.inject(Router).navigateByUrl('/');
  });

  const nobody = () => server.expectOne('/api/auth/session').flush({ signedIn: null });

  it('leads a visitor to sign in and back to where they were', async () => {
    nobody();
    expect(await shell.signInAddress()).toBe('/account/sign-in');
    await TestBed.inject(Router).navigateByUrl('/designs/d1');
    expect(await shell.signInAddress()).toBe('/account/sign-in?to=%2Fdesigns%2Fd1');
    await TestBed.inject(Router).navigateByUrl('/account/sign-up');
    expect(await shell.signInAddress()).toBe('/account/sign-in?to=%2Fdesigns%2Fd1');
  });

  it('brings the keyboard to the page when it changes, and past the bar on demand', async () => {
    nobody();
    expect(await shell.isPageFocused()).toBeFalse();
    await shell.skipToPage();
    expect(await shell.isPageFocused()).toBeTrue();
    (document.activeElement as HTMLElement).blur();
    await TestBed.inject(Router).navigateByUrl('/designs/d1');
    expect(await shell.isPageFocused()).toBeTrue();
  });

  it('says what is wrong with everything at once', async () => {
    nobody();
    expect(await shell.notices()).toEqual([]);
    TestBed.inject(ConnectionStore).failed();
    expect(await shell.notices()).toEqual([jasmine.stringMatching('No connection')]);
    TestBed.inject(ConnectionStore).answered();
    await TestBed.inject(DraftStore).list();
    expect(await shell.notices()).toEqual([jasmine.stringMatching('keeps no drafts')]);
    TestBed.inject(UnexpectedErrors).report(new Error('unforeseen'));
    expect((await shell.notices()).length).toBe(2);
    await TestBed.inject(Router).navigateByUrl('/elsewhere');
    expect((await shell.notices()).length).toBe(1);
  });

  it('switches the units of every figure', async () => {
    nobody();
    await shell.chooseUnits(/Inches/);
    expect(TestBed.inject(UnitsStore).system()).toBe('inch');
    await shell.chooseUnits(/Millimetres/);
    expect(TestBed.inject(UnitsStore).system()).toBe('mm');
  });

  it('signs out, or says that it could not', async () => {
    const account = { id: 'a', name: 'Ada', email: 'ada@forge.example' };
    server.expectOne('/api/auth/session').flush({ signedIn: { account, shops: [] } });
    await shell.signOut();
    server.expectOne('/api/auth/csrf').flush({ token: 't' });
    answerNothing(server.expectOne('/api/auth/logout'));
    await fixture.whenStable();
    expect(await (await shell.host()).text()).toContain('Not signed out');
    expect(TestBed.inject(SessionStore).account()).toEqual(account);

    await shell.signOut();
    server.expectOne('/api/auth/logout').flush(null, { status: 204, statusText: 'No Content' });
    expect(await shell.signInAddress()).not.toBeNull();
  });
});
