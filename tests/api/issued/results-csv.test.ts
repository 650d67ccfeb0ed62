import { expect, test } from 'vitest';
import { resultsCsv } from '../../../apps/api/src/issued/results-csv.ts';
import { buildReportContent } from '../../../apps/api/src/reports/build-content.ts';
import { estimated } from '../reports/estimated-entry.ts';
import { sampleCable, sampleCampaign, sampleEntry, sampleSources } from '../reports/sample-sources.ts';
import { readCsv } from './read-csv.ts';

const content = buildReportContent(
  sampleSources(
    sampleCampaign([
      estimated(sampleEntry(1)),
      sampleEntry(2, {
        cable: sampleCable(2, { ownerReference: '=HYPERLINK("x")' }),
        measurements: [],
        notMeasuredReason: 'Nest, “do not disturb”',
      }),
    ]),
  ),
);

test('has a row for each span, in the order of the report, with the very numbers of the content', () => {
  const rows = readCsv(resultsCsv(content));
  expect(rows.map(({ cable }) => cable)).toEqual(['W-01', 'W-02']);
  const { estimate, decision } = content.cables[0]!.spans[0]!;
  const [first] = rows;
  expect(Number(first!.tension_N)).toBe(estimate!.output.tension);
  expect(Number(first!.tension_standard_uncertainty_N)).toBe(estimate!.output.standardUncertainty);
  expect([Number(first!.tension_95_low_N), Number(first!.tension_95_high_N)]).toEqual(estimate!.output.interval95);
  expect(Number(first!.tension_if_hinged_N)).toBe(estimate!.output.bracket.hinged);
  expect(Number(first!.tension_if_clamped_N)).toBe(estimate!.output.bracket.clamped);
  expect(Number(first!.tension_to_reference_minus_1)).toBe(decision.toReference);
  expect(first!.zone).toBe(decision.zone);
  expect(first!.modes_used).toBe('1 2 3 4');
});

test('leaves empty what was not measured and says why', () => {
  const row = readCsv(resultsCsv(content))[1]!;
  expect(row.tension_N).toBe('');
  expect(row.zone).toBe('not-measured');
  expect(row.not_measured_reason).toBe('Nest, “do not disturb”');
});

test('does not let a text run as a formula, and leaves negative numbers as they are', () => {
  const lower = structuredClone(content);
  lower.cables[0]!.spans[0]!.decision.toReference = -0.25;
  const rows = readCsv(resultsCsv(lower));
  expect(rows[1]!.owner_reference).toBe('\'=HYPERLINK("x")');
  expect(rows[0]!.tension_to_reference_minus_1).toBe('-0.25');
});

test('gives no single tension where only bounds may be given', () => {
  const copy = structuredClone(content);
  copy.cables[0]!.spans[0]!.estimate!.output.boundsOnly = 'Above 15 % expanded uncertainty only bounds are given.';
  const [row] = readCsv(resultsCsv(copy));
  expect([row!.tension_N, row!.tension_standard_uncertainty_N]).toEqual(['', '']);
  expect(Number(row!.tension_95_low_N)).toBe(copy.cables[0]!.spans[0]!.estimate!.output.interval95[0]);
});
