export { assertRolesAreSafe } from './assert-roles.ts';
export { type AuditFault, verifyAuditChain } from './audit-chain.ts';
export { type Actor, createDb, type Db, type Tx, withFirm } from './client.ts';
export { ensureDatabase, grantDatabase, prepareDatabase, type RolePasswords, type RoleUrls } from './migrate.ts';
export * as schema from './schema/index.ts';
