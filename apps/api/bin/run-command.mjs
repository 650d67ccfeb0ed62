// npm run firm:create and npm run audit:verify: commands for whoever operates an installation.
import { install } from './bootstrap.mjs';

const [command, ...args] = process.argv.slice(2);
try {
  install();
  const { register } = await import('tsx/esm/api');
  register();
  const { openInstallation } = await import('./installation.mjs');
  const { cluster, urls, environment, address } = await openInstallation();
  try {
    process.exitCode = await runCommand({ urls, environment, address });
  } finally {
    // A server that runs beside keeps its database.
    if (cluster.startedHere) cluster.stop();
  }
  process.exit();
} catch (error) {
  console.error(error.message);
  process.exit(1);
}

async function runCommand({ urls, environment, address }) {
  if (command === 'firm-create') {
    const { runFirmCreate } = await import('../src/commands/firm-create.ts');
    await runFirmCreate(args, { ownerUrl: urls.owner, publicUrl: address });
    return 0;
  }
  if (command === 'audit-verify') {
    const { runAuditVerify } = await import('../src/commands/audit-verify.ts');
    return (await runAuditVerify({ ownerUrl: urls.owner, anchorFile: environment.ANCHOR_FILE })) ? 0 : 1;
  }
  throw new Error('The commands are firm-create and audit-verify.');
}
