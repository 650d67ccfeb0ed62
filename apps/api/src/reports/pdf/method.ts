import type { TensionEstimate } from '@strandnote/core';
import { type Formula, setFormula } from './formula.ts';
import { type Publication, publications } from './publications.ts';
import type { Report } from './report-input.ts';
import { marked, styles } from './text-layout.ts';
import { listed } from './words.ts';

interface Step {
  title: string;
  text: string;
  formulas: Formula[];
  sources: Publication[];
  /** Whether any estimate of the report used it. */
  used: (estimates: readonly TensionEstimate[]) => boolean;
}

const always = () => true;

const steps: readonly Step[] = [
  {
    title: 'Taut string',
    text: 'A cable without bending stiffness. Its natural frequencies are multiples of the first.',
    formulas: [['{f}_(n) = ', { over: '{n}', under: '2{L}' }, ' ', { root: { over: '{T}', under: '{m}' } }]],
    sources: ['blevins'],
    used: always,
  },
  {
    title: 'Stiff string with hinged ends',
    text: 'Bending stiffness raises the higher modes. On the square of the mode number the value ({f}_(n)/{n})² is a straight line: its height gives the tension, its slope the bending stiffness.',
    formulas: [['{f}_(n)² = ', { over: '{n}²', under: '4{L}²{m}' }, ' ', { within: ['{T} + ', { over: '{n}²π²{EI}', under: '{L}²' }] }]],
    sources: ['blevins'],
    used: always,
  },
  {
    title: 'Ends held elastically',
    text: 'A rotational stiffness {k} at each end, from hinged to clamped, by phase closure: the mode number stands in the equation, so that no root is missed. Below {ξ} = 25 the full determinant is solved.',
    formulas: [
      [
        '{β}{L} = {n}π + {φ}({k}_(1)) + {φ}({k}_(2))     with     {φ}({k}) = atan ',
        { over: '{k}{β}', under: '{EI} ({α}² + {β}²) + {k}{α}' },
      ],
      ['{α}² − {β}² = ', { over: '{T}', under: '{EI}' }, '     and     {m}{ω}² = {EI}{β}^(4) + {T}{β}²'],
    ],
    sources: ['blevins'],
    used: always,
  },
  {
    title: 'Fixity of the ends',
    text: 'The frequencies of a slender cable can hardly tell how its ends are held, although the tension depends on it by up to 4/{ξ}. No fixity is picked therefore. The model is fitted at the nodes of a quadrature over the fixity {η} of both ends, within what the drawings say of them; each node weighs as much as the frequencies support it. The tension is the mean of this mixture. The tensions for both ends hinged and both ends clamped stand beside every result.',
    formulas: [
      [
        '{η} = ',
        { over: '{s}', under: '1 + {s}' },
        '     with     {s} = ',
        { over: '{k}{ℓ}', under: '{EI}' },
        '     {ℓ} = ',
        { root: { over: '{EI}', under: '{T}' } },
        '     {ξ} = ',
        { over: '{L}', under: '{ℓ}' },
      ],
    ],
    sources: [],
    used: always,
  },
  {
    title: 'Sag',
    text: 'A sagging cable stretches when it swings in its plane, which raises the first mode. The axial force is added to the modes without sag:',
    formulas: [
      [
        '1 + {κ}² ',
        { over: '{EA}', under: '{L}_(e)' },
        ' {Σ}_(j) ',
        { over: '{b}_(j)²', under: '{ω}_(j)² − {ω}²' },
        ' = 0     with     {κ} = ',
        { over: '{m}{g} cos {θ}', under: '{T}' },
      ],
      [
        '{λ}² = ',
        { within: { over: '{m}{g}{L} cos {θ}', under: '{T}' } },
        '² ',
        { over: '{L}{EA}', under: '{T}{L}_(e)' },
        '     with     {L}_(e) = {L} ',
        { within: ['1 + ', { over: '1', under: '8' }, ' ', { within: { over: '{m}{g}{L} cos {θ}', under: '{T}' } }, '²'] },
      ],
    ],
    sources: ['irvineCaughey', 'irvine'],
    used: (estimates) => estimates.some(({ dimensionless }) => dimensionless.lambdaSquared !== null),
  },
  {
    title: 'Dampers',
    text: 'A damper at the distance {x}_(d) from an end shortens the cable by something between nothing and {x}_(d). Where its coefficient is not known, the whole range from free to locked enters the interval.',
    formulas: [],
    sources: ['mainJones', 'krenk', 'wittrick'],
    used: (estimates) => estimates.some(({ budget }) => budget.some(({ source }) => source === 'damper')),
  },
  {
    title: 'Published formulas beside the fit',
    text: 'Closed formulas for single modes of a cable with clamped ends stand beside the fit for comparison. They do not enter the result.',
    formulas: [],
    sources: ['zui', 'ren'],
    used: (estimates) => estimates.some(({ models }) => models.some(({ id }) => /^(zui|ren)/.test(id))),
  },
];

/** The model and its equations, as far as this report uses them, with the publications behind them. */
export function setMethod({ sheet, content, rows }: Report): void {
  const estimates = rows.flatMap(({ span }) => (span.estimate ? [span.estimate.output] : []));
  sheet.paragraph(
    'A cable under tension vibrates at natural frequencies that rise with its tension. They were read as modal peaks with their mode numbers, and the tension was fitted to them, weighted by their uncertainties, with the models below. Each model is a limit of the next.',
  );
  const used = steps.filter((step) => step.used(estimates));
  for (const step of used) setStep(sheet, step);
  sheet.heading(3, 'Symbols');
  sheet.paragraph(
    marked(
      '{f}_(n) natural frequency of mode {n} · {L} free vibrating length · {m} mass per length · {T} mean chord tension · {EI} bending stiffness · {EA} axial stiffness · {k} rotational stiffness of an end · {α}, {β} wave numbers at the ends and along the cable · {φ} phase of an end · {x}_(d) distance of a damper from its end · {θ} inclination of the chord · {L}_(e) length that stretches · {g} = 9.80665 m/s² · {ω} = 2π{f} · {b}_(j) integral of the mass-normalised mode {j}',
    ),
    styles.noteInk,
  );
  sheet.heading(3, 'Publications');
  const cited = new Set<Publication>([...used.flatMap(({ sources }) => sources), 'gum', 'ilac']);
  for (const name of cited) sheet.paragraph(publications[name], styles.noteInk, { after: 1.5 });
  sheet.space(3);
  const versions = [...new Set(estimates.map(({ engineVersion }) => engineVersion))];
  const named = versions.length === 0 ? content.engineVersion : listed(versions);
  sheet.paragraph(`The tensions were computed by the engine of Strandnote, version ${named}.`, styles.noteInk);
}

function setStep(sheet: Report['sheet'], { title, text, formulas }: Step): void {
  sheet.heading(3, title, { keep: 40 });
  sheet.paragraph(marked(text), styles.body, { after: 2 });
  for (const formula of formulas) setFormula(sheet, formula);
}
