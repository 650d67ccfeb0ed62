import type { Report } from './report-input.ts';
import { styles } from './text-layout.ts';

/** What this report does not say. */
export function setLimitations({ sheet, content }: Report): void {
  const sentences = [
    'This report gives the tension of the cables listed, at the time, temperature, traffic and stage stated, and nothing else about them.',
    'A tension within its limits does not show that wires, strands, sockets, saddles, anchorages or dampers are sound. Corrosion and broken wires inside a cable can leave its frequencies as they were.',
    'It says nothing about the capacity of a cable or of the structure under live load, wind or earthquake.',
    'Every interval rests on what was given for the cable: its length, mass, section and ends, and the mode number of each peak. Where one of them is wrong, the tension is wrong beyond the interval printed.',
    'Where safety depends on a tension, it has to be confirmed by a direct measurement, such as a lift-off or a load cell.',
    `The report was made for ${content.client.name}. What follows from it is for a licensed engineer to decide, under the codes in force and the owner’s procedures.`,
  ];
  for (const sentence of sentences) sheet.paragraph([{ text: '– ' }, { text: sentence }], styles.body, { after: 3 });
}
