import { createHash, randomUUID } from 'node:crypto';
import { type Actor, createDb, type Db, schema, type Tx, withFirm } from '@strandnote/db';
import pg from 'pg';
import { createTestDatabase, type TestDatabase } from './test-database.ts';

/** A database of its own, as the roles that tests of the database look from. */
export interface OpenDatabase extends TestDatabase {
  /** As the application: row-level security applies. */
  app: Db;
  /** As an operator with every right: to look behind, and to tamper. */
  superuser: pg.Client;
  close: () => Promise<void>;
}

export async function openTestDatabase(): Promise<OpenDatabase> {
  const database = await createTestDatabase();
  const app = createDb(database.urls.app, { connections: 25 });
  const superuser = new pg.Client({ connectionString: database.superuserUrl });
  await superuser.connect();
  const close = async () => {
    await app.$client.end();
    await superuser.end();
    await database.drop();
  };
  return { ...database, app, superuser, close };
}

export interface Firm {
  firmId: string;
  clientId: string;
  engineer: Actor;
  checker: Actor;
  client: Actor;
}

/** A firm with an engineer, a checker, and a person of a client organisation. */
export async function addFirm({ superuser }: OpenDatabase, name: string): Promise<Firm> {
  const firmId = randomUUID();
  const clientId = randomUUID();
  await superuser.query(`insert into firms (id, name, time_zone, letterhead) values ($1, $2, 'UTC', '{}')`, [firmId, name]);
  await superuser.query('insert into clients (firm_id, id, name) values ($1, $2, $3)', [firmId, clientId, `Client of ${name}`]);
  const firm = {
    engineer: actorIn(firmId, `Engineer of ${name}`, ['engineer']),
    checker: actorIn(firmId, `Checker of ${name}`, ['checker']),
    client: actorIn(firmId, `Reader at the client of ${name}`, ['client'], clientId),
  };
  for (const actor of Object.values(firm)) await addMember(superuser, actor);
  return { firmId, clientId, ...firm };
}

export function actorIn(firmId: string, name: string, roles: Actor['roles'], clientId: string | null = null): Actor {
  return { firmId, userId: randomUUID(), name, roles, clientId };
}

export async function addMember(superuser: pg.Client, { firmId, userId, name, roles, clientId }: Actor): Promise<string> {
  const id = randomUUID();
  await superuser.query('insert into members (firm_id, id, user_id, name, email, roles, client_id) values ($1, $2, $3, $4, $5, $6, $7)', [
    firmId,
    id,
    userId,
    name,
    `${userId}@strandnote.example`,
    roles,
    clientId,
  ]);
  return id;
}

export interface Bridge {
  structureId: string;
  sectionId: string;
  cableId: string;
  spanId: string;
}

/** A structure with one cable of one span, all entered by this person. */
export function addBridge(db: Db, actor: Actor): Promise<Bridge> {
  return withFirm(db, actor, async (tx) => {
    const bridge = { structureId: randomUUID(), sectionId: randomUUID(), cableId: randomUUID(), spanId: randomUUID() };
    const { firmId } = actor;
    const { structureId, sectionId, cableId, spanId } = bridge;
    await tx.insert(schema.structures).values({ firmId, id: structureId, name: 'Linden Bridge', kind: 'cable-stayed', timeZone: 'UTC' });
    await tx.insert(schema.sections).values({ firmId, id: sectionId, structureId, ...sectionValues });
    const cable = { structureId, sectionId, reference: 'W-01u', kind: 'stay', position: 0 } as const;
    await tx.insert(schema.cables).values({ firmId, id: cableId, ...cable });
    await tx.insert(schema.spans).values({ firmId, id: spanId, cableId, ...spanValues });
    return bridge;
  });
}

/** Nineteen strands of 150 mm² in a thin pipe (SI). */
export const sectionValues = {
  name: '19 strands',
  steelArea: 2.85e-3,
  modulus: 195e9,
  modulusSource: 'supplier',
  steelMass: 24.7,
  steelMassSource: 'supplier',
  sheathMass: 3.1,
  groutMass: 0,
  addedMassSource: 'design',
  bendingStiffnessLow: 1.1e4,
  bendingStiffnessHigh: 1.3e5,
  breakingLoad: 5.3e6,
  breakingLoadSource: 'supplier',
} as const;

export const spanValues = {
  position: 0,
  chordLength: 92.4,
  chordLengthSource: 'as-built',
  chordLengthTolerance: 0.05,
  lowerDeduction: 1.2,
  lowerDeductionTolerance: 0.05,
  upperDeduction: 1.2,
  upperDeductionTolerance: 0.05,
  deductionSource: 'design',
  inclination: 0.5,
  lowerEnd: { kind: 'socket' },
  upperEnd: { kind: 'socket' },
  lowerDamper: 'none',
  upperDamper: 'none',
} as const;

export interface Survey {
  campaignId: string;
  campaignCableId: string;
  measurementId: string;
  peakId: string;
  estimateId: string;
}

/** A campaign on a bridge with one measurement, one peak and one estimate, all by this person. */
export function addSurvey(db: Db, actor: Actor, bridge: Bridge, number = 1): Promise<Survey> {
  return withFirm(db, actor, async (tx) => {
    const [campaignId, campaignCableId, measurementId, peakId, estimateId] = Array.from({ length: 5 }, () => randomUUID()) as Five;
    const { firmId, userId } = actor;
    const { structureId, cableId, spanId } = bridge;
    const said = { name: 'Survey', startsOn: '2026-09-14', stage: 'In service', instruments: [], basis: noBasis };
    await tx.insert(schema.campaigns).values({ firmId, id: campaignId, structureId, number, ...said });
    await tx.insert(schema.campaignCables).values({ firmId, id: campaignCableId, campaignId, cableId });
    await tx
      .insert(schema.measurements)
      .values({ firmId, id: measurementId, campaignId, spanId, visitedAt: new Date(), enteredBy: userId, ...visitValues });
    await tx.insert(schema.modalPeaks).values({ firmId, id: peakId, measurementId, ...peakValues });
    await addEstimate(tx, actor, { estimateId, measurementId, spanId, campaignId });
    return { campaignId, campaignCableId, measurementId, peakId, estimateId };
  });
}

type Five = [string, string, string, string, string];
const noBasis = { referenceKind: null, lowerLimit: null, upperLimit: null, decisionRule: '', criticalContact: '' };
export const visitValues = {
  excitation: 'ambient',
  lowerDamperState: 'none',
  upperDamperState: 'none',
  bushingState: 'none',
  crossTied: false,
} as const;
export const peakValues = { mode: 1, frequency: 1.52, plane: 'in-plane', source: 'typed', used: true } as const;

interface EstimateOf {
  estimateId: string;
  measurementId: string;
  spanId: string;
  campaignId: string;
}

export async function addEstimate(tx: Tx, { firmId, userId }: Actor, { estimateId, ...of }: EstimateOf): Promise<void> {
  // The database keeps these two as they are given; what they mean is the business of the tests of the API.
  const opaque = {} as never;
  await tx.insert(schema.estimates).values({
    firmId,
    id: estimateId,
    ...of,
    engineVersion: '1',
    input: opaque,
    output: opaque,
    inputSha256: sha256('{}'),
    createdBy: userId,
  });
}

export function sha256(text: string | Buffer): string {
  return createHash('sha256').update(text).digest('hex');
}
