import { v7 } from 'uuid';
import { digestOfToken, newToken } from '../../api/features/session/secrets';
import { hashPassword } from '../../api/platform/password';
import type { AsOwner } from '../../api/platform/db/doors';
import {
  organisation,
  person,
  personDetails,
  refreshToken,
  session,
} from '../../api/platform/db/schema';
import { roles, type Role } from '../../shared/contract';

export const PASSWORD = 'correct horse battery';
export const fixtureOrganisations = ['ours', 'theirs'] as const;
export type FixtureOrganisation = (typeof fixtureOrganisations)[number];

/** A person with a running session, as stored. */
export interface FixturePerson {
  readonly organisationId: string;
  readonly personId: string;
  readonly sessionId: string;
  readonly refreshToken: string;
  readonly email: string;
  readonly role: Role;
}

export type Fixtures = Readonly<Record<FixtureOrganisation, Readonly<Record<Role, FixturePerson>>>>;

let passwordHash: Promise<string> | undefined;

/** Two organisations with one person of each role, each with a running session. */
export async function storeFixtures({ db }: AsOwner): Promise<Fixtures> {
  passwordHash ??= hashPassword(PASSWORD);
  const hash = await passwordHash;
  const now = new Date();
  const people = async (name: FixtureOrganisation) => {
    const organisationId = v7();
    await db.insert(organisation).values({ organisationId, name, timeZone: 'Europe/Berlin' });
    const entries: [Role, FixturePerson][] = [];
    for (const role of roles) {
      const [personId, sessionId, token] = [v7(), v7(), newToken()];
      const email = `${role}@${name}.example`;
      await db.insert(person).values({ organisationId, id: personId, role });
      await db.insert(personDetails).values({
        organisationId,
        personId,
        name: `${role} of ${name}`,
        email,
        passwordHash: hash,
      });
      await db
        .insert(session)
        .values({ organisationId, id: sessionId, personId, startedAt: now, refreshedAt: now });
      await db
        .insert(refreshToken)
        .values({ organisationId, digest: digestOfToken(token), sessionId, issuedAt: now });
      entries.push([
        role,
        { organisationId, personId, sessionId, refreshToken: token, email, role },
      ]);
    }
    return Object.fromEntries(entries) as Record<Role, FixturePerson>;
  };
  return { ours: await people('ours'), theirs: await people('theirs') };
}
