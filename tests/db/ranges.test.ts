import { randomUUID } from 'node:crypto';
import * as contract from '@strandnote/api/contract';
import { schema, withFirm } from '@strandnote/db';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { sql } from '../support/drizzle.ts';
import {
  actorIn,
  addBridge,
  addFirm,
  addMember,
  addSurvey,
  type Bridge,
  type Firm,
  type OpenDatabase,
  openTestDatabase,
  peakValues,
  type Survey,
} from '../support/fixtures.ts';
import { checkViolation, refused, uniqueViolation } from './sql-state.ts';

let database: OpenDatabase;
let firm: Firm;
let bridge: Bridge;
let survey: Survey;

beforeAll(async () => {
  database = await openTestDatabase();
  firm = await addFirm(database, 'Ashdown');
  bridge = await addBridge(database.app, firm.engineer);
  survey = await addSurvey(database.app, firm.engineer, bridge);
});
afterAll(() => database.close());

/** What a caller that skipped every check of the server could try to store. */
const impossible: [table: string, change: string][] = [
  ['sections', 'steel_area = 0'],
  ['sections', "steel_area = 'NaN'"],
  ['sections', "modulus = 'Infinity'"],
  ['sections', 'steel_mass = -1'],
  ['sections', 'sheath_mass = -0.1'],
  ['sections', 'mass_relative_uncertainty = 0'],
  ['sections', 'bending_stiffness_high = bending_stiffness_low / 2'],
  ['sections', "steel_mass_source = 'guessed'"],
  ['spans', 'chord_length = lower_deduction + upper_deduction'],
  ['spans', 'chord_length_tolerance = 0'],
  ['spans', 'upper_deduction = -0.01'],
  ['spans', "inclination = 'NaN'"],
  ['spans', "lower_damper = ''"],
  ['cables', "kind = 'rope'"],
  ['structures', "kind = 'tunnel'"],
  ['campaigns', "state = 'paused'"],
  ['campaigns', "ends_on = '2026-09-13'"],
  ['campaigns', "starts_on = '14.9.2026'"],
  ['measurements', "excitation = 'earthquake'"],
  ['measurements', "lower_damper_state = 'unknown'"],
  ['measurements', 'sensor_position = -1'],
  ['measurements', 'version = 0'],
  ['modal_peaks', 'mode = 0'],
  ['modal_peaks', 'frequency = 0'],
  ['modal_peaks', "frequency = 'NaN'"],
  ['modal_peaks', 'standard_uncertainty = 0'],
  ['modal_peaks', 'used = false'],
  ['modal_peaks', "plane = 'sideways'"],
  ['members', "units = 'stone'"],
  ['members', "roles = '{}'"],
  ['members', "roles = '{owner}'"],
];

test.each(impossible)('refuses %s where %s', async (table, change) => {
  await refused(
    withFirm(database.app, firm.engineer, (tx) => tx.execute(sql.raw(`update ${table} set ${change}`))),
    checkViolation,
  );
});

test('takes a typed 0 for sheath and grout, and no mass left blank', async () => {
  await withFirm(database.app, firm.engineer, (tx) => tx.execute(sql`update sections set sheath_mass = 0, grout_mass = 0`));
  await refused(
    withFirm(database.app, firm.engineer, (tx) => tx.execute(sql`update sections set sheath_mass = null`)),
    '23502',
  );
});

test('uses a mode once in a measurement and plane; another peak of it is set aside with a reason', async () => {
  const add = (change: object) =>
    withFirm(database.app, firm.engineer, (tx) =>
      tx
        .insert(schema.modalPeaks)
        .values({ firmId: firm.firmId, id: randomUUID(), measurementId: survey.measurementId, ...peakValues, ...change }),
    );
  await refused(add({}), uniqueViolation);
  await add({ used: false, setAsideReason: 'A double of the first.' });
  await add({ plane: 'out-of-plane' });
});

test.each([
  [['client'], false],
  [['client', 'engineer'], true],
  [['engineer'], true],
] as const)('refuses a member with the roles %j of whom the organisation is named: %s', async (roles, named) => {
  const wrong = actorIn(firm.firmId, 'Wrong', [...roles], named ? firm.clientId : null);
  await refused(addMember(database.superuser, wrong), checkViolation);
});

test('stores chunks of at most 1 MiB, under a hash that is one', async () => {
  const { firmId, engineer } = firm;
  const file = { firmId, id: randomUUID(), kind: 'record', name: 'r', mediaType: 'x', bytes: 1, sha256: 'f'.repeat(64) } as const;
  await withFirm(database.app, engineer, async (tx) => {
    await tx.insert(schema.files).values(file);
    const chunk = { firmId, id: randomUUID(), fileId: file.id, index: 0 };
    await tx.insert(schema.fileChunks).values({ ...chunk, data: Buffer.alloc(1024 * 1024) });
  });
  const chunk = { firmId, id: randomUUID(), fileId: file.id, index: 1, data: Buffer.alloc(1024 * 1024 + 1) };
  await refused(
    withFirm(database.app, engineer, (tx) => tx.insert(schema.fileChunks).values(chunk)),
    checkViolation,
  );
  await refused(
    withFirm(database.app, engineer, (tx) => tx.insert(schema.files).values({ ...file, id: randomUUID(), sha256: 'F00' })),
    checkViolation,
  );
});

test('knows the same words as the wire', () => {
  const { propertySources, cableKinds, damperFittings, referenceKinds, referencePlaces, structureKinds } = schema;
  const { dampingStates, excitations, planes, memberRoles, unitSystems, revisionStates } = schema;
  expect({ propertySources, cableKinds, damperFittings, referenceKinds, referencePlaces, structureKinds }).toEqual({
    propertySources: contract.propertySource.options,
    cableKinds: contract.cableKind.options,
    damperFittings: contract.damperFitted.options,
    referenceKinds: contract.referenceKind.options,
    referencePlaces: contract.referencePlace.options,
    structureKinds: contract.structureKind.options,
  });
  expect({ dampingStates, excitations, planes, memberRoles, unitSystems, revisionStates }).toEqual({
    dampingStates: contract.dampingState.options,
    excitations: contract.excitation.options,
    planes: contract.plane.options,
    memberRoles: contract.role.options,
    unitSystems: contract.unitSystem.options,
    revisionStates: contract.revisionState.options,
  });
});
