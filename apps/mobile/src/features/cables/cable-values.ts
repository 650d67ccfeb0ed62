import type {
  Cable,
  CableKind,
  CreateCable,
  CreateSection,
  PropertySource,
  Section,
  Span,
  SpanEnd,
  UnitSystem,
} from '@strandnote/api/contract';
import { emptyEntry, enteredValue, type QuantityEntry } from '../../lib/quantity-entry.ts';

/** What the form holds of a section; a chosen one is named by `sectionId`, a new one is described by the rest. */
export interface SectionValues {
  sectionId: string | null;
  name: string;
  strandKey: string | null;
  strandCount: QuantityEntry;
  steelArea: QuantityEntry;
  modulus: QuantityEntry;
  modulusSource: PropertySource | null;
  steelMass: QuantityEntry;
  steelMassSource: PropertySource | null;
  sheathMass: QuantityEntry;
  groutMass: QuantityEntry;
  addedMassSource: PropertySource | null;
  massUncertainty: QuantityEntry;
  bendingStiffnessLow: QuantityEntry;
  bendingStiffnessHigh: QuantityEntry;
  breakingLoad: QuantityEntry;
  breakingLoadSource: PropertySource | null;
}

export interface SpanValues {
  id: string;
  name: string;
  chordLength: QuantityEntry;
  chordLengthSource: PropertySource | null;
  chordLengthTolerance: QuantityEntry;
  lowerDeduction: QuantityEntry;
  lowerDeductionTolerance: QuantityEntry;
  upperDeduction: QuantityEntry;
  upperDeductionTolerance: QuantityEntry;
  deductionSource: PropertySource | null;
  inclination: QuantityEntry;
  lowerEnd: EndValues;
  upperEnd: EndValues;
  lowerDamper: 'none' | 'fitted' | null;
  upperDamper: 'none' | 'fitted' | null;
  damperPosition: QuantityEntry;
}

export interface EndValues {
  kind: SpanEnd['kind'] | null;
  low: QuantityEntry;
  high: QuantityEntry;
  rotationalStiffness: QuantityEntry;
}

export interface CableValues {
  reference: string;
  ownerReference: string;
  paintedMark: string;
  kind: CableKind | null;
  section: SectionValues;
  spans: SpanValues[];
  designTension: QuantityEntry;
  designStage: string;
  designSource: string;
}

export const newSection: SectionValues = {
  sectionId: null,
  name: '',
  strandKey: null,
  strandCount: emptyEntry,
  steelArea: emptyEntry,
  modulus: emptyEntry,
  modulusSource: null,
  steelMass: emptyEntry,
  steelMassSource: null,
  sheathMass: emptyEntry,
  groutMass: emptyEntry,
  addedMassSource: null,
  massUncertainty: emptyEntry,
  bendingStiffnessLow: emptyEntry,
  bendingStiffnessHigh: emptyEntry,
  breakingLoad: emptyEntry,
  breakingLoadSource: null,
};

const newEnd: EndValues = { kind: null, low: emptyEntry, high: emptyEntry, rotationalStiffness: emptyEntry };

export function newSpan(): SpanValues {
  return {
    id: crypto.randomUUID(),
    name: '',
    chordLength: emptyEntry,
    chordLengthSource: null,
    chordLengthTolerance: emptyEntry,
    lowerDeduction: emptyEntry,
    lowerDeductionTolerance: emptyEntry,
    upperDeduction: emptyEntry,
    upperDeductionTolerance: emptyEntry,
    deductionSource: null,
    inclination: emptyEntry,
    lowerEnd: newEnd,
    upperEnd: newEnd,
    lowerDamper: null,
    upperDamper: null,
    damperPosition: emptyEntry,
  };
}

export function newCable(): CableValues {
  return {
    reference: '',
    ownerReference: '',
    paintedMark: '',
    kind: null,
    section: newSection,
    spans: [newSpan()],
    designTension: emptyEntry,
    designStage: '',
    designSource: '',
  };
}

export function cableValues(cable: Cable, system: UnitSystem): CableValues {
  const { reference, ownerReference, paintedMark, kind, section, spans } = cable;
  return {
    ...newCable(),
    reference,
    ownerReference,
    paintedMark,
    kind,
    section: sectionValues(section, system),
    spans: spans.map((span) => spanValues(span, system)),
  };
}

export function sectionValues(section: Section, system: UnitSystem): SectionValues {
  return {
    sectionId: section.id,
    name: section.name,
    strandKey: section.strandKey,
    strandCount: enteredValue(section.strandCount, 'count', system),
    steelArea: enteredValue(section.steelArea, 'area', system),
    modulus: enteredValue(section.modulus, 'modulus', system),
    modulusSource: section.modulusSource,
    steelMass: enteredValue(section.steelMass, 'mass-per-length', system),
    steelMassSource: section.steelMassSource,
    sheathMass: enteredValue(section.sheathMass, 'mass-per-length', system),
    groutMass: enteredValue(section.groutMass, 'mass-per-length', system),
    addedMassSource: section.addedMassSource,
    massUncertainty: enteredValue(section.massRelativeUncertainty, 'percent', system),
    bendingStiffnessLow: enteredValue(section.bendingStiffnessLow, 'bending-stiffness', system),
    bendingStiffnessHigh: enteredValue(section.bendingStiffnessHigh, 'bending-stiffness', system),
    breakingLoad: enteredValue(section.breakingLoad, 'force', system),
    breakingLoadSource: section.breakingLoadSource,
  };
}

function spanValues(span: Span, system: UnitSystem): SpanValues {
  const metres = (value: number | null) => enteredValue(value, 'length', system);
  const millimetres = (value: number) => enteredValue(value, 'small-length', system);
  return {
    id: span.id,
    name: span.name,
    chordLength: metres(span.chordLength),
    chordLengthSource: span.chordLengthSource,
    chordLengthTolerance: millimetres(span.chordLengthTolerance),
    lowerDeduction: metres(span.lowerDeduction),
    lowerDeductionTolerance: millimetres(span.lowerDeductionTolerance),
    upperDeduction: metres(span.upperDeduction),
    upperDeductionTolerance: millimetres(span.upperDeductionTolerance),
    deductionSource: span.deductionSource,
    inclination: enteredValue(span.inclination, 'angle', system),
    lowerEnd: endValues(span.lowerEnd, system),
    upperEnd: endValues(span.upperEnd, system),
    lowerDamper: span.lowerDamper,
    upperDamper: span.upperDamper,
    damperPosition: metres(span.damperPosition),
  };
}

function endValues(end: SpanEnd, system: UnitSystem): EndValues {
  const base = { ...newEnd, kind: end.kind };
  if (end.kind === 'fixity') return { ...base, low: enteredValue(end.low, 'ratio', system), high: enteredValue(end.high, 'ratio', system) };
  if (end.kind === 'stiffness')
    return { ...base, rotationalStiffness: enteredValue(end.rotationalStiffness, 'rotational-stiffness', system) };
  return base;
}

/** The section as it is sent; every field was checked before. */
export function sectionBody(values: SectionValues): Omit<CreateSection, 'id'> {
  return {
    name: values.name,
    strandKey: values.strandKey,
    strandCount: values.strandCount.si,
    steelArea: values.steelArea.si!,
    modulus: values.modulus.si!,
    modulusSource: values.modulusSource!,
    steelMass: values.steelMass.si!,
    steelMassSource: values.steelMassSource!,
    sheathMass: values.sheathMass.si!,
    groutMass: values.groutMass.si!,
    addedMassSource: values.addedMassSource!,
    massRelativeUncertainty: values.massUncertainty.si,
    bendingStiffnessLow: values.bendingStiffnessLow.si!,
    bendingStiffnessHigh: values.bendingStiffnessHigh.si!,
    breakingLoad: values.breakingLoad.si!,
    breakingLoadSource: values.breakingLoadSource!,
  };
}

export function spanBody(values: SpanValues): CreateCable['spans'][number] {
  return {
    id: values.id,
    name: values.name,
    chordLength: values.chordLength.si!,
    chordLengthSource: values.chordLengthSource!,
    chordLengthTolerance: values.chordLengthTolerance.si!,
    lowerDeduction: values.lowerDeduction.si!,
    lowerDeductionTolerance: values.lowerDeductionTolerance.si!,
    upperDeduction: values.upperDeduction.si!,
    upperDeductionTolerance: values.upperDeductionTolerance.si!,
    deductionSource: values.deductionSource!,
    inclination: values.inclination.si!,
    lowerEnd: endBody(values.lowerEnd),
    upperEnd: endBody(values.upperEnd),
    lowerDamper: values.lowerDamper!,
    upperDamper: values.upperDamper!,
    damperPosition: values.damperPosition.si,
  };
}

function endBody({ kind, low, high, rotationalStiffness }: EndValues): SpanEnd {
  if (kind === 'fixity') return { kind, low: low.si!, high: high.si! };
  if (kind === 'stiffness') return { kind, rotationalStiffness: rotationalStiffness.si! };
  return { kind: kind! };
}
