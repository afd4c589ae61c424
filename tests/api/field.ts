import { v7 } from 'uuid';
import type { CaseEvent, EventType, PayloadOf } from '../../shared/cases';
import { stringCircuit } from '../../shared/circuit';
import { USUAL_METER } from '../../shared/diagnosis';
import type { EventResult } from '../../shared/contract';
import { circuit, circuitRevision, lift, site } from '../../api/platform/db/schema';
import type { FixtureOrganisation } from './fixtures';
import type { TestServer, Visitor } from './server';

/** A site with one lift and its circuit in each organisation. */
export interface Field {
  readonly siteId: string;
  readonly liftId: string;
  readonly circuitId: string;
  readonly label: string;
}

/** Written in one line: a pit stop and a gate contact, and the relay at the end. */
export const fieldCircuit = stringCircuit(
  '110 V DC earthed: 1 (pit stop) 2 (gate contact) 3 [lock relay 3300 ohm]',
);

export async function storeField(
  server: TestServer,
  organisation: FixtureOrganisation,
  label: string,
): Promise<Field> {
  const { organisationId } = server.fixtures[organisation].technician;
  const [siteId, liftId, circuitId] = [v7(), v7(), v7()];
  await server.asOwner(async ({ db }) => {
    await db
      .insert(site)
      .values({ organisationId, id: siteId, name: 'A site', address: 'A street' });
    await db.insert(circuit).values({ organisationId, id: circuitId, name: 'A circuit' });
    await db.insert(circuitRevision).values({
      organisationId,
      circuitId,
      revision: 1,
      issuedAt: new Date('2026-01-01T00:00:00Z'),
      circuit: fieldCircuit,
    });
    await db.insert(lift).values({
      organisationId,
      id: liftId,
      siteId,
      name: 'A lift',
      label,
      maker: 'A maker',
      controller: 'A controller',
      landings: ['Hall', 'Roof'],
      hazards: [],
      circuitId,
      circuitRevision: 1,
    });
  });
  return { siteId, liftId, circuitId, label };
}

/** A phone that numbers its events; nothing is sent by itself. */
export class TestPhone {
  readonly device = v7();
  private sequence = 0;

  constructor(private readonly visitor: Visitor) {}

  event<T extends EventType>(
    caseId: string,
    type: T,
    payload: PayloadOf<T>,
    more: Partial<CaseEvent> = {},
  ): CaseEvent {
    this.sequence += 1;
    return {
      id: v7(),
      caseId,
      device: this.device,
      sequence: this.sequence,
      schema: 1,
      type,
      payload: payload as Record<string, unknown>,
      recordedAt: new Date().toISOString(),
      state: {},
      ...more,
    };
  }

  open(field: Field, caseId: string = v7()): CaseEvent {
    return this.event(caseId, 'case opened', {
      liftId: field.liftId,
      circuitId: field.circuitId,
      circuitRevision: 1,
      complaint: 'Dead',
      practice: false,
    });
  }

  note(caseId: string, text = 'A note'): CaseEvent {
    return this.event(caseId, 'note written', { text });
  }

  reading(caseId: string, red: string, volts: number, more: Partial<CaseEvent> = {}): CaseEvent {
    return this.event(
      caseId,
      'reading taken',
      {
        red,
        black: 'R',
        function: 'dc volts',
        volts,
        meter: USUAL_METER,
        place: 'controller',
        entered: 'digits',
      },
      more,
    );
  }

  /** A whole case, closed as *no access*: the shortest that a supervisor may review. */
  closedCase(field: Field, caseId: string = v7()): CaseEvent[] {
    return [this.open(field, caseId), this.event(caseId, 'case closed', { outcome: 'no access' })];
  }

  async send(events: readonly unknown[]): Promise<EventResult[]> {
    const answer = await this.visitor
      .post('/api/sync/events', { device: this.device, events: [...events] })
      .expect(200);
    return (answer.body as { results: EventResult[] }).results;
  }
}

export const outcomesOf = (results: readonly EventResult[]): string[] =>
  results.map(({ outcome, code }) => (code ? `${outcome} ${code}` : outcome));
