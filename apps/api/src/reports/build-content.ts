import type { CampaignCable, CampaignDetail, Firm, Structure } from '@strandnote/api/contract';
import type { FrozenCable, ReportContent, ReportTexts } from '@strandnote/core/report-content';
import { freezeReference } from './freeze-reference.ts';
import { freezeSpan } from './freeze-span.ts';

/** What a report's content is put together from; the campaign as the checklist shows it, narrowed to the report's cables. */
export interface ReportSources {
  engineVersion: string;
  firm: Firm;
  client: { id: string; name: string; address: string };
  report: { number: string; title: string; letter: string };
  author: { userId: string; name: string };
  structure: Structure;
  campaign: CampaignDetail;
  texts: ReportTexts;
}

/**
 * The content of a report as it stands: what a submission would freeze. The same sources always give the same content, so
 * that its hash tells whether anything has changed since somebody looked.
 */
export function buildReportContent(sources: ReportSources): ReportContent {
  return {
    version: 1,
    engineVersion: sources.engineVersion,
    firm: firmOf(sources.firm),
    client: sources.client,
    report: sources.report,
    author: sources.author,
    structure: structureOf(sources.structure),
    campaign: campaignOf(sources.campaign),
    texts: sources.texts,
    cables: sources.campaign.cables.map((entry) => freezeCable(entry, sources.campaign)),
  };
}

function firmOf(firm: Firm): ReportContent['firm'] {
  const { addressLines, phone, email, registration } = firm.letterhead;
  return { name: firm.name, addressLines, phone, email, registration, demonstration: firm.demonstration };
}

function structureOf(structure: Structure): ReportContent['structure'] {
  const { id, name, reference, kind, ownerName, place, timeZone, elevation } = structure;
  return { id, name, reference, kind, ownerName, place, timeZone, elevation };
}

function campaignOf(campaign: CampaignDetail): ReportContent['campaign'] {
  const { id, number, name, startsOn, endsOn, crew, instruments, weather, steelTemperature, airTemperature, traffic, stage, basis } =
    campaign;
  return { id, number, name, startsOn, endsOn, crew, instruments, weather, steelTemperature, airTemperature, traffic, stage, basis };
}

function freezeCable(entry: CampaignCable, campaign: CampaignDetail): FrozenCable {
  const { cable } = entry;
  const referenceTension = freezeReference(cable, campaign);
  return {
    id: cable.id,
    reference: cable.reference,
    ownerReference: cable.ownerReference,
    paintedMark: cable.paintedMark,
    kind: cable.kind,
    sectionName: cable.section.name,
    lowerAnchor: cable.lowerAnchor,
    upperAnchor: cable.upperAnchor,
    referenceTension,
    notMeasuredReason: entry.notMeasuredReason,
    spans: cable.spans.map((span) => freezeSpan(span, { entry, campaign, reference: referenceTension })),
  };
}
