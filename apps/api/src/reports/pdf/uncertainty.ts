import type { BudgetLine } from '@strandnote/core';
import { percent } from './quantities.ts';
import type { Report } from './report-input.ts';
import { setTable } from './table.ts';
import { styles } from './text-layout.ts';
import { counted } from './words.ts';

interface SourceOfUncertainty {
  label: string;
  count: number;
  contributions: number[];
  shares: number[];
}

/** What the intervals mean, and what they are made of over all cables. */
export function setUncertainty({ sheet, rows }: Report): void {
  const estimates = rows.flatMap(({ span }) => (span.estimate ? [span.estimate.output] : []));
  sheet.paragraph(
    'Each tension is stated with its expanded uncertainty U, half the width of its 95 % interval. U is the standard uncertainty times a factor k, which stands on the page of the cable. The interval holds the middle 95 % of the distribution of the tension, which contains the frequencies, the free length, the mass, the bending stiffness, the fixity of the ends and, where they act, dampers. It was evaluated after JCGM 100:2008; U is rounded to two significant figures and the tension to the same place. No input was taken as exact: where no uncertainty was stated, the one that follows from its source was used.',
  );
  sheet.paragraph(
    'The tension of one day and its change since an earlier day are different questions: mass, length and ends are common to both and cancel from the change. The difference of two tensions in this report is therefore not a measured change, and their intervals cannot be compared as if they were independent.',
  );
  if (estimates.length === 0) return;
  sheet.heading(3, `What the uncertainty is made of, over ${counted(estimates.length, 'estimate')}`, { keep: 80 });
  setTable(sheet, {
    rows: sources(estimates.flatMap(({ budget }) => budget)),
    columns: [
      { head: 'Source', width: 150, cell: ({ label }) => label },
      { head: 'in estimates', width: 66, align: 'right', style: styles.figure, cell: ({ count }) => String(count) },
      {
        head: 'adds to u(T)/T, %, median',
        width: 88,
        align: 'decimal',
        style: styles.figure,
        cell: ({ contributions }) => percent(median(contributions), 2),
      },
      {
        head: 'share of variance %, median',
        width: 88,
        align: 'right',
        style: styles.figure,
        cell: ({ shares }) => percent(median(shares), 0),
      },
      {
        head: 'from … to',
        width: sheet.width - 392,
        align: 'right',
        style: styles.figure,
        cell: ({ shares }) => `${percent(Math.min(...shares), 0)} – ${percent(Math.max(...shares), 0)}`,
      },
    ],
  });
  sheet.space(4);
  sheet.paragraph('The budget of each cable stands on its own page.', styles.note);
}

function sources(lines: readonly BudgetLine[]): SourceOfUncertainty[] {
  const bySource = new Map<string, BudgetLine[]>();
  for (const line of lines) bySource.set(line.source, [...(bySource.get(line.source) ?? []), line]);
  return [...bySource.values()]
    .map((own) => ({
      label: own[0]!.label,
      count: own.length,
      contributions: own.map(({ contribution }) => contribution),
      shares: own.map(({ shareOfVariance }) => shareOfVariance),
    }))
    .toSorted((a, b) => median(b.shares) - median(a.shares));
}

function median(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  const middle = sorted.length / 2;
  return Number.isInteger(middle) ? (sorted[middle - 1]! + sorted[middle]!) / 2 : sorted[Math.floor(middle)]!;
}
