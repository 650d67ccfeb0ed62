import type { ReportContent } from '@strandnote/core/report-content';

/** The words that a signature stands for. They are shown before signing and stored with the signature as they were. */
export interface SignedRevision {
  number: string;
  letter: string;
  clientName: string;
  firmName: string;
}

export function signedRevisionOf({ report, client, firm }: ReportContent): SignedRevision {
  return { number: report.number, letter: report.letter, clientName: client.name, firmName: firm.name };
}

export function preparedStatement({ number, letter }: SignedRevision): string {
  return `I prepared report ${number}, revision ${letter}. Its inputs, mode numbers, estimates and texts are complete to the best of my knowledge, and I submit this content, as frozen under the hash named with my signature, for an independent check.`;
}

export function checkedStatement({ number, letter }: SignedRevision): string {
  return `I have checked report ${number}, revision ${letter}, independently: each cable's inputs and their sources, its mode numbers, models and residuals, the comparison and the texts. I prepared no part of it. I approve the content under the hash named with my signature for issue.`;
}

export function issuedStatement({ number, letter, clientName, firmName }: SignedRevision): string {
  return `Issued for ${firmName} to ${clientName}: report ${number}, revision ${letter}, with the content that was checked and approved under the hash named with this signature.`;
}
