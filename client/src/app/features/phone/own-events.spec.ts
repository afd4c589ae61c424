import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { OwnEvent } from '../../core/device/device-database';
import { DeviceStore } from '../../core/device/device-store';
import { inMemoryPhone, noteEvent, opening, technician } from '../../core/device/in-memory-phone';
import { SessionStore } from '../../core/session/session-store';
import { OwnEvents } from './own-events';

const LIFT_NAME = 'Goods lift';

function shown(events: readonly OwnEvent[]): HTMLElement {
  const caseId = events[0]!.caseId;
  TestBed.configureTestingModule({
    providers: [
      ...inMemoryPhone().providers,
      provideRouter([]),
      {
        provide: DeviceStore,
        useValue: {
          cases: () => [{ id: caseId, liftId: opening.liftId }],
          lift: () => ({ name: LIFT_NAME, siteId: 's' }),
          site: () => ({ name: 'Copper Lane Mill' }),
        },
      },
      { provide: SessionStore, useValue: { session: () => technician } },
    ],
  });
  const fixture = TestBed.createComponent(OwnEvents);
  fixture.componentRef.setInput('events', events);
  fixture.detectChanges();
  return fixture.nativeElement as HTMLElement;
}

const own = (sequence: number, more: Partial<OwnEvent> = {}): OwnEvent => ({
  sequence,
  caseId: 'case',
  kept: 'kept here',
  event: { ...noteEvent(`event ${sequence}`, 'case'), sequence },
  ...more,
});

describe('what is only on this phone', () => {
  it('is shown in words, under the lift that it belongs to', () => {
    const page = shown([own(1)]);
    expect(page.querySelector('h3')?.textContent).toContain(`Copper Lane Mill, ${LIFT_NAME}`);
    expect(page.querySelector('li')?.textContent).toContain('Keeper moved 4 mm');
    expect(page.querySelector('details')).toBeNull();
  });

  it('has its reason and all its data where the server refused it', () => {
    const refused = own(2, { kept: 'refused', code: 'case-closed', details: { status: 'closed' } });
    const page = shown([refused]);
    expect(page.querySelector('.reason')?.textContent).toContain('closed');
    expect(JSON.parse(page.querySelector('pre')!.textContent!)).toEqual(refused.event);
  });

  it('says the code of a refusal that this build has no sentence for', () => {
    const page = shown([own(3, { kept: 'refused', code: 'of-a-later-server' })]);
    expect(page.querySelector('.reason')?.textContent).toContain('of-a-later-server');
  });
});
