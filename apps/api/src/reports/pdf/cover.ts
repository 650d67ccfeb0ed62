import { setCautions } from './cautions.ts';
import { days } from './dates.ts';
import { type Definition, setDefinitions } from './definitions.ts';
import { setElevation } from './elevation.ts';
import { ink } from './ink.ts';
import type { Report } from './report-input.ts';
import { styles, type TextStyle } from './text-layout.ts';
import { setZoneSummary } from './zone-summary.ts';

const firmName: TextStyle = { face: 'text-strong', size: 11, leading: 1.25, pigment: 'ink' };
const subtitle: TextStyle = { face: 'text', size: 10.5, leading: 1.3, pigment: 'muted' };

/** The first page: who reports what to whom, what came out, and how to read it. */
export function setCover(report: Report): void {
  const { sheet, content } = report;
  sheet.newPage();
  setLetterhead(report);
  sheet.heading(1, content.report.title);
  sheet.paragraph(`Tensions of ${content.cables.length} cables of ${content.structure.name}, estimated from their vibration`, subtitle, {
    after: 8,
  });
  setDefinitions(sheet, facts(report), { columns: 2, perColumn: 3, termWidth: 56 });
  setZoneSummary(report);
  sheet.space(8);
  setElevation(report, { maxHeight: 168 });
  setCautions(report);
}

function setLetterhead({ sheet, content }: Report): void {
  const { firm } = content;
  sheet.paragraph(firm.name, firmName, { after: 0 });
  const lines = [firm.addressLines.join(', '), [firm.phone, firm.email].filter(Boolean).join(', '), firm.registration].filter(Boolean);
  sheet.paragraph(lines.join('  ·  '), styles.note, { after: 6 });
  sheet.artifact(() => sheet.rule(sheet.left, sheet.room.right, sheet.y, 0.8, ink.ink));
  sheet.space(10);
}

function facts({ content, input }: Report): Definition[] {
  const { client, structure, campaign, report } = content;
  const signer = (meaning: string) => input.signatures.findLast((signature) => signature.meaning === meaning)?.name;
  return [
    { term: 'For', value: [{ text: client.name, face: 'text-strong' }, { text: client.address ? `\n${client.address}` : '' }] },
    { term: 'Structure', value: [structure.name, structure.reference, structure.place].filter(Boolean).join(', ') },
    { term: 'Owner', value: structure.ownerName || client.name },
    { term: 'Survey', value: `Campaign ${campaign.number}, ${campaign.name}, ${days(campaign.startsOn, campaign.endsOn)}` },
    { term: 'Report', value: `${report.number}, revision ${report.letter}` },
    { term: 'Prepared', value: signer('prepared') ?? `${content.author.name}, not signed` },
    { term: 'Checked', value: signer('checked and approved') ?? 'by nobody yet' },
  ];
}
