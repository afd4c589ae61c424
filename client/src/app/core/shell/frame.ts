import {
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  computed,
  effect,
  inject,
  viewChild,
} from '@angular/core';
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
import { DeviceStore } from '../device/device-store';
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

  private readonly content = viewChild.required<ElementRef<HTMLElement>>('content');
  private readonly path = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map(({ urlAfterRedirects }) => urlAfterRedirects.replace(/[?#].*$/, '')),
    ),
  );
  private pathBefore?: string;
  private readonly store = inject(DeviceStore);

  protected readonly unusable = computed(() => this.store.status() === 'unusable');
  protected readonly tooOld = this.store.tooOld;
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

  constructor() {
    // A reader of the screen hears the new page; at the first one the browser does that by itself.
    effect(() => {
      const path = this.path();
      if (path === undefined || path === this.pathBefore) return;
      if (this.pathBefore !== undefined) this.toContent();
      this.pathBefore = path;
    });
  }

  protected toContent(): void {
    this.content().nativeElement.focus({ preventScroll: true });
  }
}

function deepest(snapshot: ActivatedRouteSnapshot): ActivatedRouteSnapshot {
  return snapshot.firstChild ? deepest(snapshot.firstChild) : snapshot;
}
