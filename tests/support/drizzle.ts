// Queries of the database's package, for tests that build their rows through it: the very copy that it uses itself.
export { and, eq, is, sql } from '../../packages/db/node_modules/drizzle-orm/index.js';
export { getTableConfig, PgTable } from '../../packages/db/node_modules/drizzle-orm/pg-core/index.js';
