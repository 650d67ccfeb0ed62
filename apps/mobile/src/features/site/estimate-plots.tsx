import type { Measurement } from '@strandnote/api/contract';
import type { StoredEstimate } from '@strandnote/core/report-content';
import { FitPlot, type FitPlotProps, ResidualPlot } from '../../drawings/index.ts';
import { Columns, Heading, Panel, Text } from '../../ui/index.ts';

/** Models whose curves tell something apart; the others coincide with them to the eye. */
const drawnModels = [
  { id: 'adopted', name: 'adopted' },
  { id: 'hinged', name: 'hinged' },
  { id: 'clamped', name: 'clamped' },
];

export function EstimatePlots({ output, measurement }: { output: StoredEstimate; measurement: Measurement }) {
  const peaks = measurement.peaks.map(({ mode, frequency, standardUncertainty, used }) => ({
    mode,
    frequency,
    used,
    ...(standardUncertainty === null ? {} : { standardUncertainty }),
  }));
  const residuals = output.residuals.map(({ mode, relative }, index) => ({
    mode,
    residual: relative,
    standardUncertainty: output.inputs.frequencyUncertainty[index],
    used: true,
  }));
  return (
    <Columns>
      {[
        <Panel key="fit">
          <Heading level={2}>Fit</Heading>
          <FitPlot peaks={peaks} curves={curvesOf(output)} height={280} />
          <Text size="note" tone="muted">
            A string lies level; bending stiffness makes the line rise. A point off the line has a wrong number or another source.
          </Text>
        </Panel>,
        <Panel key="residuals">
          <Heading level={2}>Residuals</Heading>
          <ResidualPlot residuals={residuals} height={280} />
          <Text size="note" tone="muted">
            {goodnessWords(output)}
          </Text>
        </Panel>,
      ]}
    </Columns>
  );
}

function curvesOf(output: StoredEstimate): FitPlotProps['curves'] {
  return drawnModels.flatMap(({ id, name }) => {
    const residuals = output.models.find((model) => model.id === id)?.residuals ?? [];
    return residuals.length === 0 ? [] : [{ name, values: residuals.map(({ mode, fitted }) => ({ mode, frequency: fitted })) }];
  });
}

function goodnessWords({ goodness: { chiSquared, degreesOfFreedom, pValue, scale } }: StoredEstimate): string {
  if (degreesOfFreedom <= 0) return 'There are no more peaks than unknowns, so the residuals cannot judge the fit.';
  const chance = pValue === null ? '' : `; by chance alone it would be larger in ${(100 * pValue).toPrecision(2)} % of surveys`;
  const widened = scale > 1 ? ` The uncertainties were enlarged ${scale.toPrecision(2)} times to match.` : '';
  return `χ² is ${chiSquared.toPrecision(3)} with ${degreesOfFreedom} degrees of freedom${chance}.${widened}`;
}
