import type { AppDeps } from '../deps.ts';
import { marrowFirthCrossing, tansyWeirBridge } from './county.ts';
import type { DemonstrationAccount } from './open-demonstration.ts';
import { seedCampaign } from './seed-campaign.ts';
import { seedPeople } from './seed-people.ts';
import { seedIssue, seedSubmittedReport } from './seed-report.ts';
import { type EnteredCable, seedStructure } from './seed-structure.ts';
import { type SeededRandom, seededRandom } from './seeded-random.ts';
import type { Truth } from './simulate-survey.ts';

/**
 * An invented county with two invented bridges: one campaign issued, the next in progress, and one report in check. Everything
 * goes through the same commands as a person's work, with a clock in the past. Frequencies are simulated (./simulate-survey).
 *
 * @param past the clock of `deps`, moved along here
 * @returns the accounts with their passwords
 */
export async function seedDemonstration(deps: AppDeps, ownerUrl: string, past: { at: Date }): Promise<DemonstrationAccount[]> {
  const random = seededRandom(20_260_412);
  const now = past.at;
  const people = await seedPeople(deps, ownerUrl, random);
  const { engineer } = people.actors;
  past.at = new Date('2025-05-12T08:00:00Z');
  const crossing = await seedStructure(deps, engineer, marrowFirthCrossing(), people.clientId, random);
  const weir = await seedStructure(deps, engineer, tansyWeirBridge(), people.clientId, random);

  const truths = new Map(crossing.cables.map((cable) => [cable.cableId, truthOf(cable, random)]));
  const visit = (cable: EnteredCable, change: number) => {
    const truth = truths.get(cable.cableId)!;
    return { cable, truth: { ...truth, tension: truth.tension * change }, modeCount: 6 + Math.floor(3 * random.uniform()) };
  };
  const blocked = crossing.cables.find(({ cable }) => cable.reference === 'W-10d')!;
  const spring = await seedCampaign(
    deps,
    engineer,
    {
      structureId: crossing.structureId,
      name: 'Spring survey 2025',
      day: '2025-05-14',
      steelTemperature: 13,
      visited: crossing.cables.filter((cable) => cable !== blocked).map((cable) => visit(cable, 1)),
      excused: [{ cable: blocked, reason: 'Access platform out of order; to be measured at the next survey.' }],
      limits: [0.92, 1.08],
    },
    random,
  );
  past.at = new Date('2025-06-02T09:00:00Z');
  const issued = await seedSubmittedReport(
    deps,
    people,
    { campaignId: spring, title: 'Cable tensions of the Marrow Firth Crossing, spring 2025', texts: springTexts },
    random,
  );
  past.at = new Date('2025-06-05T14:30:00Z');
  await seedIssue(deps, people, issued);

  // A year and a half later: most stays as they were within a percent, one has gained nearly a tenth.
  past.at = new Date('2026-11-23T16:00:00Z');
  const moved = (cable: EnteredCable) => (cable.cable.reference === 'E-05d' ? 1.09 : 1 + 0.004 * random.normal());
  await seedCampaign(
    deps,
    engineer,
    {
      structureId: crossing.structureId,
      name: 'Autumn survey 2026',
      day: '2026-11-23',
      steelTemperature: 9,
      visited: crossing.cables
        .filter(({ cable }) => /^(W-..|E-0[1-5])[ud]$/.test(cable.reference))
        .map((cable) => visit(cable, moved(cable))),
      excused: [],
      limits: [0.92, 1.08],
    },
    random,
  );

  past.at = new Date('2026-10-06T10:00:00Z');
  const hangers = await seedCampaign(
    deps,
    engineer,
    {
      structureId: weir.structureId,
      name: 'Hanger survey 2026',
      day: '2026-10-06',
      steelTemperature: 12,
      visited: weir.cables.map((cable) => ({ cable, truth: truthOf(cable, random), modeCount: 5 })),
      excused: [],
      limits: [0.9, 1.1],
    },
    random,
  );
  past.at = new Date('2026-11-09T11:00:00Z');
  await seedSubmittedReport(
    deps,
    people,
    { campaignId: hangers, title: 'Hanger tensions of the Tansy Weir Bridge, 2026', texts: weirTexts },
    random,
  );
  past.at = now;
  return people.accounts;
}

/** How a cable of the demonstration really is: near its design tension, two of them well off. */
function truthOf({ cable, designTension }: EnteredCable, random: SeededRandom): Truth {
  const off: Record<string, number> = { 'W-03u': 0.935, 'E-08u': 1.13, 'H-06n': 0.84 };
  const tension = designTension * (off[cable.reference] ?? 1 + 0.018 * random.normal());
  return { tension, bond: 0.25 + 0.5 * random.uniform(), fixity: 0.75 + 0.2 * random.uniform() };
}

const springTexts = {
  scope:
    'Tension of the 40 stays of the Marrow Firth Crossing under permanent load, estimated from vibration, compared with the design tension. The data are invented and the frequencies simulated.',
  conditions: 'Overcast, 13 °C steel temperature, wind 3 to 5 m/s, one lane closed. Ambient vibration, ten minutes a stay.',
  deviations: 'Stay W-10d was not measured: the access platform was out of order.',
  conclusion:
    'The intervals of the stays are set against 0.92 to 1.08 of the design tension as agreed. Stay E-08u lies above its upper limit; whether anything follows from it is for the licensed engineer of the owner to decide.',
};

const weirTexts = {
  scope:
    'Tension of the 22 hangers of the Tansy Weir Bridge under permanent load, estimated from vibration. The data are invented and the frequencies simulated.',
  conditions: 'Overcast, 12 °C steel temperature, light wind, one lane closed.',
  deviations: 'None.',
  conclusion:
    'The intervals are set against 0.90 to 1.10 of the design tension as agreed. Hanger H-06n lies below its lower limit; whether anything follows from it is for the licensed engineer of the owner to decide.',
};
