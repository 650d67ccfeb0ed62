/** The public surface of the engineering core. */

// The cable
export {
  type Attachment,
  type Cable,
  type CableUncertainty,
  checkCable,
  checkPeaks,
  type EndCondition,
  type ModalPeak,
} from './cable/cable.ts';
export { memberModuli, type StrandType, steelThermalExpansion, strandCatalogue } from './cable/catalogue.ts';
export { boundaryLayerLength, sagExtensibility, stringLikeness } from './cable/dimensionless.ts';
export { defaultLengthTolerance, defaultRelativeUncertainty, type PropertySource } from './cable/property-source.ts';
export { roundBarStiffness, type StrandSection, strandSection } from './cable/section.ts';
export {
  fixityOfDetail,
  freeLength,
  massPerLength,
  type SurveyedEnd,
  type SurveyedSection,
  type SurveyedSpan,
  type SurveyedVisit,
  surveyedCable,
} from './cable/surveyed-span.ts';
// Decision
export {
  type AgreedBasis,
  type AgreedDecision,
  chooseReference,
  decideAsAgreed,
  type HungCable,
  referenceAtMeanChord,
  type StatedReference,
} from './decision/agreed-reference.ts';
export {
  canBeProven,
  type Decision,
  type DecisionQuestion,
  type DecisionZone,
  decide,
  type ProvenZone,
  type TensionPlace,
  tensionAt,
} from './decision/decide.ts';
// Errors
export { EstimationError, type EstimationErrorCode } from './errors.ts';
// The fit
export { type ChangeOptions, type TensionChange, tensionChange } from './fit/change.ts';
export { estimateTension } from './fit/estimate-tension.ts';
export { fitHingedLine, fitLine, type HingedLineFit, type LineFit } from './fit/linear-fit.ts';
export { type MonteCarloResult, monteCarloTension } from './fit/monte-carlo.ts';
export { type PlausibilityQuestion, questionPlausibility } from './fit/plausibility.ts';
export {
  type BudgetLine,
  type EffectiveInputs,
  ENGINE_VERSION,
  type EstimateInput,
  type EstimateNote,
  type EstimateOptions,
  type ModelRow,
  type PeakResidual,
  type StiffnessPrior,
  type TensionEstimate,
} from './fit/tension-estimate.ts';
// Forward models
export { type DampedMode, dampedFrequencies } from './models/damped-frequencies.ts';
export { modeShape } from './models/mode-shape.ts';
export { type CableState, naturalFrequencies } from './models/natural-frequencies.ts';
export { type FormulaCable, type FormulaTension, practicalFormulas } from './models/practical-formulas.ts';
export { stiffStringFrequencies } from './models/stiff-string.ts';
export { tautStringFrequencies, tautStringTension } from './models/taut-string.ts';
// Mode numbers
export { auditNumbering, type NumberingAudit } from './modes/audit-numbering.ts';
export { type ModeNumbering, type NumberingOptions, numberModes } from './modes/number-modes.ts';

// Units
export {
  decimalsOfUncertainty,
  formatInterval,
  formatNumber,
  formatWithUncertainty,
  type ParsedNumber,
  parseNumber,
  type RoundedQuantity,
} from './units/format.ts';
export { fromSi, type Quantity, toSi, type Unit, type UnitSystem, unitOf } from './units/units.ts';
