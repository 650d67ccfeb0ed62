import type { IssuedReport, Verification } from '@strandnote/api/contract';

/** What holds for an issued report now, in words. */
export function stateWords(report: Pick<IssuedReport | Verification, 'state' | 'supersededByLetter'>): string {
  if (report.state === 'issued') return 'current';
  if (report.state === 'withdrawn') return 'withdrawn';
  return report.supersededByLetter ? `superseded by revision ${report.supersededByLetter}` : 'superseded';
}

export const stateTone = { issued: 'verdigris', superseded: 'ochre', withdrawn: 'minium' } as const;
