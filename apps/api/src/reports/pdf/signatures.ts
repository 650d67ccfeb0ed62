import type { Signature } from '@strandnote/api/contract';
import { moment } from './dates.ts';
import { setDefinitions } from './definitions.ts';
import type { Report } from './report-input.ts';
import { styles, type TextStyle } from './text-layout.ts';

const hash: TextStyle = { ...styles.figure, size: 7.6 };

/** Who prepared, checked and approved this content, in which words, when, and under which hash. */
export function setSignatures(report: Report): void {
  const { sheet, content, input } = report;
  if (input.signatures.length === 0) {
    sheet.paragraph('Nobody has signed this content. It is a draft: not checked, not approved, not issued.', styles.strong);
  }
  for (const signature of input.signatures.filter(({ meaning }) => meaning !== 'issued')) setSignature(report, signature);
  sheet.heading(3, 'Issued');
  sheet.paragraph(
    input.draft
      ? 'Not issued.'
      : `This file is issued by the electronic signature that it carries (PAdES B-B, in the name of ${content.firm.name}). The time of issue stands in that signature. A copy without a valid signature is not the issued report.${content.firm.demonstration ? ' This is a demonstration: the certificate of that signature proves nothing.' : ''}`,
  );
  sheet.heading(3, 'Seals of the content');
  setDefinitions(
    sheet,
    [
      { term: 'Content SHA-256', value: input.contentSha256, style: hash },
      {
        term: 'Audit trail',
        value: input.auditHead
          ? [
              { text: `Entry ${input.auditHead.sequence} of the firm’s chain of audit entries, SHA-256\n`, face: 'text' },
              { text: input.auditHead.hash, face: 'figures' },
            ]
          : 'A draft carries no entry.',
        style: input.auditHead ? hash : styles.cell,
      },
    ],
    { termWidth: 100 },
  );
}

function setSignature({ sheet, content }: Report, signature: Signature): void {
  const licence = [signature.licenceNumber, signature.jurisdiction].filter(Boolean).join(', ');
  sheet.heading(3, signature.meaning === 'prepared' ? 'Prepared' : 'Checked and approved', { keep: 96 });
  setDefinitions(
    sheet,
    [
      { term: 'Name', value: signature.name, style: { ...styles.cell, face: 'text-strong', size: 9.5 } },
      { term: 'Licence', value: licence || 'none stated' },
      { term: 'Signed', value: moment(signature.signedAt, content.structure.timeZone) },
      { term: 'Meaning', value: signature.statement },
      { term: 'Content SHA-256', value: signature.contentSha256, style: hash },
    ],
    { termWidth: 100 },
  );
}
