import type { Role } from '@shared/contract';
import type { Services } from '../../platform/services';
import { standingOf, type SessionKey } from './repository';

/** How long an answer is believed, milliseconds: revoking takes effect within 10 s on every process. */
const BELIEVED = 3_000;
/** Answers kept; the oldest go first. */
const MOST_KEPT = 10_000;

/** Whether session and person are still good, and the role: asked of the database every few seconds. */
export class Standing {
  private readonly kept = new Map<
    string,
    { readonly role: Role | undefined; readonly at: number }
  >();

  constructor(private readonly services: Pick<Services, 'database' | 'clock'>) {}

  /** The role; undefined when this session may do nothing any more. */
  async roleOf({ organisationId, personId, sessionId }: SessionKey): Promise<Role | undefined> {
    const now = this.services.clock().getTime();
    const known = this.kept.get(sessionId);
    if (known && now - known.at < BELIEVED && now >= known.at) return known.role;
    const role = await this.services.database.inOrganisation(organisationId, personId, (org) =>
      standingOf(org, sessionId),
    );
    this.keep(sessionId, role, now);
    return role;
  }

  /** Called when a session ends here: this process knows at once. */
  forget(sessionId: string): void {
    this.kept.delete(sessionId);
  }

  private keep(sessionId: string, role: Role | undefined, at: number): void {
    this.kept.delete(sessionId);
    this.kept.set(sessionId, { role, at });
    const oldest = this.kept.keys().next();
    if (this.kept.size > MOST_KEPT && !oldest.done) this.kept.delete(oldest.value);
  }
}
