import type { Actor } from '@strandnote/db';
import { createCable } from '../cables/write-cable.ts';
import { addReference } from '../cables/write-reference.ts';
import { createSection } from '../cables/write-section.ts';
import type { AppDeps } from '../deps.ts';
import { createStructure } from '../structures/write-structure.ts';
import type { DemonstrationCable, DemonstrationStructure } from './county.ts';
import type { SeededRandom } from './seeded-random.ts';

/** A cable of the demonstration with the ids that it was entered under. */
export interface EnteredCable extends DemonstrationCable {
  cableId: string;
  spanId: string;
}

export const finishedStage = 'In service, permanent load';

/** Enters a structure with its sections, cables and design tensions. */
export async function seedStructure(
  deps: AppDeps,
  engineer: Actor,
  { structure, cables }: DemonstrationStructure,
  clientId: string,
  random: SeededRandom,
): Promise<{ structureId: string; cables: EnteredCable[] }> {
  const structureId = random.uuid();
  await createStructure(deps, engineer, { ...structure, id: structureId, clientId });
  const sectionIds = new Map<string, string>();
  const entered: EnteredCable[] = [];
  for (const entry of cables) {
    let sectionId = sectionIds.get(entry.section.name);
    if (sectionId === undefined) {
      sectionId = random.uuid();
      sectionIds.set(entry.section.name, sectionId);
      await createSection(deps, engineer, structureId, { ...entry.section, id: sectionId });
    }
    const cableId = random.uuid();
    const spanId = random.uuid();
    await createCable(deps, engineer, structureId, { ...entry.cable, id: cableId, sectionId, spans: [{ ...entry.span, id: spanId }] });
    await addReference(deps, engineer, cableId, {
      id: random.uuid(),
      kind: 'design',
      stage: finishedStage,
      place: 'mean-chord',
      value: entry.designTension,
      relativeUncertainty: null,
      source: 'Design calculation, sheet C-12 (invented)',
      dated: '2009-03-02',
    });
    entered.push({ ...entry, cableId, spanId });
  }
  return { structureId, cables: entered };
}
