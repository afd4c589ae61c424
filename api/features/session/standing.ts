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
  async roleOf(key: SessionKey): Promise<Role | undefined> {
    const { organisationId, personId, sessionId } = key;
    const now = this.services.clock().getTime();
    const known = this.kept.get(nameOf(key));
    if (known && now - known.at < BELIEVED && now >= known.at) return known.role;
    const role = await this.services.database.inOrganisation(organisationId, personId, (org) =>
      standingOf(org, sessionId),
    );
    this.keep(nameOf(key), role, now);
    return role;
  }

  /** Called when a session ends here: this process knows at once. */
  forget(key: SessionKey): void {
    this.kept.delete(nameOf(key));
  }

  private keep(name: string, role: Role | undefined, at: number): void {
    this.kept.delete(name);
    this.kept.set(name, { role, at });
    const oldest = this.kept.keys().next();
    if (this.kept.size > MOST_KEPT && !oldest.done) this.kept.delete(oldest.value);
  }
}

/** All three: an answer about one person's session says nothing about another person with it. */
const nameOf = ({ organisationId, personId, sessionId }: SessionKey): string =>
  `${organisationId} ${personId} ${sessionId}`;
