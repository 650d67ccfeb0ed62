import type { ReportContent } from '@strandnote/core/report-content';

/** An id that is the same in every run: of the kind and the place of what it names. */
export function uuid(kind: number, index: number): string {
  return `00000000-0000-4000-80${kind}0-${String(index + 1).padStart(12, '0')}`;
}

/** Everything of a sample report but its cables: an invented firm, client, bridge and campaign. */
export const reportFrame: Omit<ReportContent, 'cables'> = {
  version: 1,
  engineVersion: '1.0.0',
  firm: {
    name: 'Falk and Reyes, Structural Engineers',
    addressLines: ['1 Quay Street', 'Port Ansel'],
    phone: '+00 5550 1234',
    email: 'office@falk-reyes.example',
    registration: 'Registered in Ansel no. 004417',
    demonstration: true,
  },
  client: { id: uuid(8, 0), name: 'Ansel County Roads', address: 'County Hall, 40 Mill Lane, Port Ansel' },
  report: { number: 'SN-0231', title: 'Cable tensions of Marrow Firth Crossing, autumn 2026', letter: 'B' },
  author: { userId: 'author', name: 'Ines Falk' },
  structure: {
    id: uuid(9, 0),
    name: 'Marrow Firth Crossing',
    reference: 'AC-0117',
    kind: 'cable-stayed',
    ownerName: 'Ansel County',
    place: 'Marrow Firth, Ansel County',
    timeZone: 'Europe/London',
    elevation: {
      deck: [
        { x: -245, z: 0 },
        { x: 245, z: 0 },
      ],
      supports: [
        [
          { x: -125, z: -24 },
          { x: -125, z: 66 },
        ],
        [
          { x: 125, z: -24 },
          { x: 125, z: 66 },
        ],
      ],
    },
  },
  campaign: {
    id: uuid(7, 0),
    number: 4,
    name: 'Autumn survey 2026',
    startsOn: '2026-09-01',
    endsOn: '2026-09-03',
    crew: 'Ines Falk, Tomas Reyes',
    instruments: [
      { name: 'Accelerometer, three axes, 10 V/g', serial: 'A-2217', calibratedOn: '2026-02-11', calibrationDue: '2027-02-11' },
      { name: 'Logger, 24 bit, 200 samples/s', serial: 'L-0032', calibratedOn: '2025-11-20', calibrationDue: '2026-11-20' },
      { name: 'Contact thermometer', serial: 'T-9', calibratedOn: null, calibrationDue: null },
    ],
    weather: 'Dry, overcast, wind 3 to 6 m/s from the west',
    steelTemperature: 15,
    airTemperature: 14,
    traffic: 'One lane in each direction, lorries allowed',
    stage: 'In service',
    basis: {
      referenceKind: 'design',
      lowerLimit: 0.95,
      upperLimit: 1.05,
      decisionRule: 'A cable is within or outside when its whole 95 % interval is; otherwise it is reported as not proven.',
      criticalContact: 'Duty engineer of Ansel County Roads, +00 5550 9900',
    },
  },
  texts: {
    scope:
      'Tension of the stays of the crossing by ambient vibration, for comparison with the design tensions at the finished stage. Anchorages, sockets and dampers were not inspected.',
    conditions:
      'The survey took place on three dry days. The deck carried its usual traffic on one lane in each direction; the other lanes were closed for the crew.\n\nSteel temperature was read on the sunny and the shaded side of four stays in the morning and in the afternoon.',
    deviations: 'Two stays could not be reached because of the painters’ scaffold; they are listed with the reason.',
    conclusion:
      'The tensions agree with the design within the agreed limits except where the table says otherwise. We recommend a lift-off reading of the stay found outside, before the resurfacing in spring, and a second visit to the stays that were not measured.',
  },
};
