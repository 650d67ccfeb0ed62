import type { Quantities } from './quantities.ts';
import type { Report } from './report-input.ts';
import { type Inline, styles } from './text-layout.ts';

/** What every tension has to be read with, on the first page. */
export function setCautions({ sheet, content, quantities, input }: Report): void {
  sheet.heading(3, 'Read these results with care', { keep: 70 });
  const sentences: string[] = [
    `The tensions were estimated from vibration. Each is an average over the record at ${circumstances(content.campaign, quantities)}.`,
    'An interval holds only if the cable, its mode numbers, its length and its mass are what this report says they are.',
    'A normal tension does not show that wires or anchorages are sound, nor what the cable can carry under live load.',
    'Where safety depends on a tension, this is no substitute for measuring it directly. The decision belongs to a licensed engineer under the local codes and the owner’s procedures.',
  ];
  if (input.draft) sentences.unshift('Nobody has checked these results yet.');
  for (const sentence of sentences) sheet.paragraph(dashed(sentence), styles.noteInk, { after: 1.5 });
}

/** What stands on the pages of a cable behind its first. */
export const reminder =
  'Estimated from vibration; right only if cable, mode numbers, length and mass are right, and no proof of sound wires, anchorages or capacity. The cautions on the first page of this report belong to these figures.';

/** The same in one breath, beside results. */
export function shortCaution({ content, quantities, input }: Report): string {
  return `${input.draft ? 'Not checked by anybody yet. ' : ''}Estimated from vibration: averages at ${circumstances(content.campaign, quantities)}. The intervals hold only if cable, mode numbers, length and mass are right. A normal tension does not show that wires or anchorages are sound, nor capacity under live load. The decision belongs to a licensed engineer.`;
}

function circumstances({ steelTemperature, traffic }: Report['content']['campaign'], quantities: Quantities): string {
  const temperature = quantities.temperature(steelTemperature);
  return [
    temperature ? `a steel temperature of ${temperature}` : 'a steel temperature that was not noted',
    traffic ? `traffic as noted (${lowerFirst(traffic)})` : 'traffic that was not noted',
  ].join(' and ');
}

function lowerFirst(text: string): string {
  // "M6 closed" stays as it is: only a plain capital goes.
  return /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}

function dashed(sentence: string): Inline {
  return [{ text: '– ' }, { text: sentence }];
}
