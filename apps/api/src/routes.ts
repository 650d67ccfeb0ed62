import { auditRoutes } from './audit/audit.routes.ts';
import { cableRoutes } from './cables/cables.routes.ts';
import { campaignRoutes } from './campaigns/campaigns.routes.ts';
import { clientRoutes } from './clients/clients.routes.ts';
import { demonstrationRoutes } from './demonstration/demonstration.routes.ts';
import { deskRoutes } from './desk/desk.routes.ts';
import { estimateRoutes } from './estimates/estimates.routes.ts';
import { firmRoutes } from './firms/firms.routes.ts';
import { docsRoutes } from './http/docs.routes.ts';
import type { Route } from './http/route.ts';
import { issuedRoutes } from './issued/issued.routes.ts';
import { meRoutes } from './me/me.routes.ts';
import { measurementRoutes } from './measurements/measurements.routes.ts';
import { memberRoutes } from './members/members.routes.ts';
import { checkingRoutes } from './reports/checking.routes.ts';
import { reportRoutes } from './reports/reports.routes.ts';
import { structureRoutes } from './structures/structures.routes.ts';
import { verificationRoutes } from './verification/verification.routes.ts';

/** Every route of the API: what is served, described and tested. */
export const routes: readonly Route[] = [
  ...docsRoutes(() => routes),
  ...demonstrationRoutes,
  ...meRoutes,
  ...firmRoutes,
  ...memberRoutes,
  ...clientRoutes,
  ...structureRoutes,
  ...cableRoutes,
  ...campaignRoutes,
  ...measurementRoutes,
  ...estimateRoutes,
  ...reportRoutes,
  ...checkingRoutes,
  ...issuedRoutes,
  ...verificationRoutes,
  ...deskRoutes,
  ...auditRoutes,
];
