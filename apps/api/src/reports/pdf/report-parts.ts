import { setBasis } from './basis.ts';
import { setCablePage } from './cable-page.ts';
import { setConditions } from './conditions.ts';
import { type ListedPart, setContents } from './contents.ts';
import { setCover } from './cover.ts';
import { setLimitations } from './limitations.ts';
import { setMethod } from './method.ts';
import { hasUnmeasured, setNotMeasured } from './not-measured.ts';
import { isMeasured, type Report } from './report-input.ts';
import { setResultsTable } from './results-table.ts';
import { setSignatures } from './signatures.ts';
import { setUncertainty } from './uncertainty.ts';
import { setVerification } from './verification.ts';

interface Part {
  title: string;
  set: (report: Report) => void;
  /** Left out of a report that has nothing for it. */
  belongs?: (report: Report) => boolean;
  /** Begins on a page of its own. */
  apart?: boolean;
}

const parts: readonly Part[] = [
  { title: 'Scope', set: ({ sheet, content }) => sheet.paragraph(content.texts.scope || 'The engineer has not written a scope.') },
  {
    title: 'Conclusion',
    set: ({ sheet, content }) => sheet.paragraph(content.texts.conclusion || 'The engineer has not written a conclusion.'),
  },
  { title: 'Basis of assessment', set: setBasis },
  { title: 'Results of all cables', set: setResultsTable, apart: true },
  { title: 'Cables not measured', set: setNotMeasured, belongs: hasUnmeasured },
  { title: 'Conditions of the survey', set: setConditions },
  { title: 'Method', set: setMethod },
  { title: 'Uncertainty', set: setUncertainty },
  { title: 'Limitations', set: setLimitations },
  { title: 'Prepared, checked, approved', set: setSignatures },
  { title: 'Verify this report', set: setVerification },
];

/** Sets the whole report: first page, contents, the numbered parts, and a leaf for every cable that was measured. */
export function setReport(report: Report): void {
  const { sheet, rows } = report;
  const numbered = parts
    .filter(({ belongs }) => belongs?.(report) ?? true)
    .map((part, index) => ({ ...part, title: `${index + 1}  ${part.title}`, destination: `part-${String(index + 1).padStart(2, '0')}` }));
  const measured = rows.filter(isMeasured);
  const leaves: ListedPart[] =
    measured.length > 0 ? [{ title: `${numbered.length + 1}  Cables one by one`, destination: measured[0]!.destination }] : [];
  sheet.section(() => setCover(report));
  sheet.newPage();
  sheet.section(() => setContents(report, [...numbered, ...leaves]));
  for (const { title, destination, set, apart } of numbered) {
    if (apart) sheet.newPage();
    sheet.section(() => {
      sheet.heading(2, title, { name: destination });
      set(report);
    });
  }
  for (const row of measured) sheet.section(() => setCablePage(report, row));
}
