import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import {
  NavigationEnd,
  Router,
  RouterLink,
  RouterLinkActive,
  RouterOutlet,
  type ActivatedRouteSnapshot,
} from '@angular/router';
import { filter, map } from 'rxjs';
import { Connection } from '../device/connection';
import { SessionStore } from '../session/session-store';
import { LampMark } from './lamp-mark';
import { placesOf } from './navigation';
import { roleNames } from './role-names';
import { Updates } from './updates';

/** Rail on a desk, bar at the foot of a phone; a bare page has the whole screen of a phone. */
@Component({
  selector: 'app-frame',
  imports: [LampMark, RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './frame.html',
  styleUrl: './frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Frame {
  private readonly router = inject(Router);
  private readonly sessions = inject(SessionStore);
  private readonly data = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map(() => deepest(this.router.routerState.snapshot.root).data),
    ),
  );

  protected readonly updates = inject(Updates);
  protected readonly online = inject(Connection).online;
  protected readonly session = this.sessions.session;
  protected readonly signInToSend = this.sessions.signInToSend;
  protected readonly places = computed(() => {
    const role = this.sessions.role();
    return role ? placesOf[role] : [];
  });
  protected readonly role = computed(() => {
    const role = this.sessions.role();
    return role ? roleNames[role] : '';
  });
  /** Without navigation at all, or without it on a phone. */
  protected readonly alone = computed(() => !this.session());
  protected readonly bare = computed(() => Boolean(this.data()?.['bare']));
}

function deepest(snapshot: ActivatedRouteSnapshot): ActivatedRouteSnapshot {
  return snapshot.firstChild ? deepest(snapshot.firstChild) : snapshot;
}
