import { foldCase, isReviewType } from '../shared/cases';
import { appendAudit } from '../api/platform/db/audit';
import { caseLine } from '../api/platform/db/caseLine';
import { asOwner, type AsOwner } from '../api/platform/db/doors';
import {
  caseEvent,
  caseRow,
  circuit,
  circuitRevision,
  counter,
  lift,
  organisation,
  person,
  personDetails,
  site,
} from '../api/platform/db/schema';
import { sentDigest } from '../api/platform/db/storedEvent';
import { hashPassword } from '../api/platform/password';
import type { DemoAccount } from './accounts';
import { circuitId, liftId, personId } from './cases/playAll';
import { playedLog } from './cases/playedLog';
import { companies, type SeedCompany } from './companies';
import { seedId } from './seedId';

/** When the demo's circuits were issued. */
const ISSUED = new Date('2026-08-01T08:00:00.000Z');
/** Seconds between the recording and the receipt of a demo event. */
const SENT_AFTER = 90;

/**
 * Loads the demo companies into an empty database; into one that has an organisation, nothing.
 * @returns the demo accounts, those of the first company first
 */
export async function loadDemo(ownerUrl: string): Promise<readonly DemoAccount[]> {
  await asOwner(ownerUrl, async (owner) => {
    const [known] = await owner.db
      .select({ id: organisation.organisationId })
      .from(organisation)
      .limit(1);
    if (known) return;
    for (const company of companies) await loadCompany(owner, company);
  });
  return companies.flatMap(({ accounts }) => accounts);
}

async function loadCompany({ db }: AsOwner, company: SeedCompany): Promise<void> {
  const organisationId = seedId(`organisation ${company.key}`);
  const { name, timeZone } = company;
  await db.insert(organisation).values({ organisationId, name, timeZone });
  for (const account of company.accounts) {
    const id = personId(account.email);
    await db.insert(person).values({ organisationId, id, role: account.role });
    await db.insert(personDetails).values({
      organisationId,
      personId: id,
      name: account.name,
      email: account.email,
      passwordHash: await hashPassword(account.password),
    });
  }
  for (const [key, drawn] of Object.entries(company.circuits)) {
    const id = circuitId(company.key, key);
    await db.insert(circuit).values({ organisationId, id, name: drawn.name });
    await db
      .insert(circuitRevision)
      .values({ organisationId, circuitId: id, revision: 1, issuedAt: ISSUED, circuit: drawn });
  }
  for (const { name: siteName, address, lifts } of company.sites) {
    const siteId = seedId(`site ${siteName}`);
    await db.insert(site).values({ organisationId, id: siteId, name: siteName, address });
    await db.insert(lift).values(
      lifts.map(({ circuit: key, hidden, landings, hazards, ...rest }) => ({
        ...rest,
        organisationId,
        id: liftId(rest.label),
        siteId,
        landings: [...landings],
        hazards: [...hazards],
        circuitId: circuitId(company.key, key),
        circuitRevision: 1,
        practiceFaults: [...hidden],
      })),
    );
  }
  await loadCases({ db }, organisationId, company);
}

async function loadCases(
  { db }: AsOwner,
  organisationId: string,
  company: SeedCompany,
): Promise<void> {
  const versions = new Map<string, number>();
  const rows = playedLog(company.key).map(({ event, actor }, k) => {
    const caseVersion = (versions.get(event.caseId) ?? 0) + 1;
    versions.set(event.caseId, caseVersion);
    return {
      ...event,
      organisationId,
      actor,
      receivedAt: new Date(Date.parse(event.recordedAt) + SENT_AFTER * 1000),
      clockOffsetSeconds: -SENT_AFTER,
      caseVersion,
      position: k + 1,
      sentDigest: sentDigest(event),
    };
  });
  await db.insert(caseEvent).values(rows);
  // The organisation's trigger has made its counter; positions are taken up to the last event.
  await db
    .insert(counter)
    .values({ organisationId, position: rows.length })
    .onConflictDoUpdate({ target: counter.organisationId, set: { position: rows.length } });
  for (const caseId of versions.keys()) {
    const state = foldCase(rows.filter((row) => row.caseId === caseId).map(folded));
    if (state) await db.insert(caseRow).values({ ...caseLine(state), organisationId });
  }
  for (const { type, caseId, actor, receivedAt } of rows) {
    if (!isReviewType(type)) continue;
    await appendAudit(
      { db, organisationId, personId: actor },
      { action: type, subject: `case ${caseId}`, outcome: 'done', at: receivedAt },
    );
  }
}

const folded = (row: typeof caseEvent.$inferInsert) => ({
  ...row,
  receivedAt: row.receivedAt.toISOString(),
});
