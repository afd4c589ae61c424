import { Pipe, inject, type PipeTransform } from '@angular/core';
import { CLOCK } from '../device/clock';
import { SessionStore } from '../session/session-store';

/**
 * A time as people of the organisation say it, in the organisation's zone: *14:32* today, else with the
 * day before it. @param language BCP 47; `en` says the day before the month
 */
export function localTime(
  at: number | string,
  now: number,
  timeZone: string | undefined,
  language: string,
): string {
  const format = (options: Intl.DateTimeFormatOptions, of: number | string): string =>
    new Intl.DateTimeFormat(language === 'en' ? 'en-GB' : language, {
      ...options,
      timeZone,
    }).format(new Date(of));
  const day: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'short', year: 'numeric' };
  const time = format({ hour: '2-digit', minute: '2-digit' }, at);
  return format(day, at) === format(day, now) ? time : `${format(day, at)}, ${time}`;
}

@Pipe({ name: 'localTime' })
export class LocalTime implements PipeTransform {
  private readonly clock = inject(CLOCK);
  private readonly sessions = inject(SessionStore);

  /** @param at ISO 8601, or milliseconds since 1970 */
  transform(at: number | string): string {
    const zone = this.sessions.session()?.organisation.timeZone;
    return localTime(at, this.clock.now(), zone, document.documentElement.lang || 'en');
  }
}
