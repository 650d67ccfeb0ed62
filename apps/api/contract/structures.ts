import { z } from 'zod';
import { id, listOf, optionalText, typedText } from './primitives.ts';

export const structureKind = z.enum(['cable-stayed', 'arch', 'suspension', 'roof', 'mast', 'other']);
export type StructureKind = z.infer<typeof structureKind>;

const vertex = z.strictObject({ x: z.number(), z: z.number() });
/** What the elevation shows besides cables: deck and supports as lines (m, x along, z up). */
export const elevationLines = z.strictObject({
  deck: z.array(vertex).max(200),
  supports: z.array(z.array(vertex).max(50)).max(40),
});
export type ElevationLines = z.infer<typeof elevationLines>;

const structureFields = {
  name: typedText(120),
  reference: optionalText(60),
  kind: structureKind,
  ownerName: optionalText(120),
  clientId: id.nullable(),
  place: optionalText(200),
  timeZone: typedText(60),
  elevation: elevationLines.nullable(),
  notes: optionalText(),
};
export const createStructure = z.strictObject({ id, ...structureFields });
export type CreateStructure = z.infer<typeof createStructure>;
export const editStructure = z.strictObject(structureFields).partial();
export type EditStructure = z.infer<typeof editStructure>;

export const structure = z.object({ id, ...structureFields, cableCount: z.number().int() });
export type Structure = z.infer<typeof structure>;
export const structureList = listOf(structure);
