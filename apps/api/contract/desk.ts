import { z } from 'zod';
import { id, isoDate } from './primitives.ts';
import { revisionSummary } from './reports.ts';

/** What waits for the person who asks. */
export const desk = z.object({
  campaigns: z.array(
    z.object({
      id,
      name: z.string(),
      structureId: id,
      structureName: z.string(),
      startsOn: isoDate,
      cableCount: z.number().int(),
      measuredCount: z.number().int(),
      notMeasuredCount: z.number().int(),
    }),
  ),
  drafts: z.array(revisionSummary),
  returned: z.array(revisionSummary),
  toCheck: z.array(revisionSummary.extend({ cableCount: z.number().int(), tickedCount: z.number().int(), openComments: z.number().int() })),
  toIssue: z.array(revisionSummary),
  /** Cables whose tension differs between the last two campaigns by more than their intervals together (N). */
  moved: z.array(
    z.object({
      cableId: id,
      reference: z.string(),
      structureName: z.string(),
      before: z.object({
        tension: z.number(),
        interval95: z.tuple([z.number(), z.number()]),
        startsOn: isoDate,
        steelTemperature: z.number().nullable(),
      }),
      after: z.object({
        tension: z.number(),
        interval95: z.tuple([z.number(), z.number()]),
        startsOn: isoDate,
        steelTemperature: z.number().nullable(),
      }),
    }),
  ),
});
export type Desk = z.infer<typeof desk>;
