// Queries of the database's package, for tests that build their rows through it: the very copy that it uses itself.
export { and, eq, sql } from '../../packages/db/node_modules/drizzle-orm/index.js';
