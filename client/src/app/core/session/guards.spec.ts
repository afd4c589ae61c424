import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import {
  UrlTree,
  type ActivatedRouteSnapshot,
  type CanActivateFn,
  type RouterStateSnapshot,
} from '@angular/router';
import type { Role } from '@shared/contract';
import { technician } from '../device/in-memory-phone';
import { hasRole, homeOf, signedIn } from './guards';
import { SessionStore } from './session-store';

function asked(guard: CanActivateFn, url: string, role?: Role): unknown {
  TestBed.configureTestingModule({
    providers: [
      {
        provide: SessionStore,
        useValue: { session: signal(role && technician), role: signal(role) },
      },
    ],
  });
  const answer = TestBed.runInInjectionContext(() =>
    guard({} as ActivatedRouteSnapshot, { url } as RouterStateSnapshot),
  );
  return answer instanceof UrlTree ? answer.toString() : answer;
}

describe('guards', () => {
  it('let in who is signed in', () => {
    expect(asked(signedIn, '/cases', 'technician')).toBe(true);
  });

  it('send others to the sign-in page, and remember where they wanted to go', () => {
    expect(asked(signedIn, '/cases/1')).toBe('/sign-in?back=%2Fcases%2F1');
  });

  it('let in the roles that they name, and send others to their own start', () => {
    expect(asked(hasRole('supervisor'), '/review', 'supervisor')).toBe(true);
    TestBed.resetTestingModule();
    expect(asked(hasRole('supervisor'), '/review', 'technician')).toBe('/');
  });

  it('start each role where its day starts', () => {
    const homes = (['technician', 'engineer', 'supervisor', 'administrator'] as const).map(homeOf);
    expect(homes).toEqual(['/lifts', '/lifts', '/review', '/people']);
  });
});
