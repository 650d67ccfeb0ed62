import { id, measurement, putMeasurement as putMeasurementBody } from '@strandnote/api/contract';
import { z } from 'zod';
import { firmRoute } from '../http/route.ts';
import { putMeasurement } from './put-measurement.ts';

export const measurementRoutes = [
  firmRoute({
    method: 'put',
    path: '/campaigns/:campaignId/measurements/:measurementId',
    access: 'campaign.edit',
    summary: 'Creates a measurement with its peaks or replaces it whole; told what is stored when somebody else changed it',
    params: z.object({ campaignId: id, measurementId: id }),
    body: putMeasurementBody,
    reply: measurement,
    handle: ({ deps, who, params, body }) => putMeasurement(deps, who, params, body),
  }),
];
