import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { PdfDocument } from './pdf-document.ts';

/** The cuts that a report is set in. `fallback` has the letters that the others lack: Greek and Cyrillic words, rare signs. */
export type Face = 'text' | 'text-strong' | 'figures' | 'figures-strong' | 'symbol' | 'fallback';

const packages = '@expo-google-fonts';
const files: Record<Face, string> = {
  text: `${packages}/atkinson-hyperlegible-next/400Regular/AtkinsonHyperlegibleNext_400Regular.ttf`,
  'text-strong': `${packages}/atkinson-hyperlegible-next/600SemiBold/AtkinsonHyperlegibleNext_600SemiBold.ttf`,
  figures: `${packages}/atkinson-hyperlegible-mono/400Regular/AtkinsonHyperlegibleMono_400Regular.ttf`,
  'figures-strong': `${packages}/atkinson-hyperlegible-mono/600SemiBold/AtkinsonHyperlegibleMono_600SemiBold.ttf`,
  symbol: `${packages}/stix-two-text/400Regular_Italic/STIXTwoText_400Regular_Italic.ttf`,
  fallback: `${packages}/stix-two-text/400Regular/STIXTwoText_400Regular.ttf`,
};
const faceNames = Object.keys(files) as Face[];
/** Where a letter is looked for that a face lacks, in this order. */
const substitutes: Record<Face, Face[]> = {
  text: ['symbol', 'fallback'],
  'text-strong': ['symbol', 'fallback'],
  figures: ['text', 'symbol', 'fallback'],
  'figures-strong': ['text-strong', 'symbol', 'fallback'],
  symbol: ['fallback', 'text'],
  fallback: ['text'],
};

const resolve = createRequire(import.meta.url).resolve;
const bytes = new Map<Face, Buffer>();

/** What pdfkit knows of a font and its types do not tell. */
interface OpenFont {
  font: {
    hasGlyphForCodePoint(codePoint: number): boolean;
    unitsPerEm: number;
    layout(text: string): { glyphs: { advanceWidth: number; path: { toSVG(): string } }[] };
  };
  widthOfString(text: string, size: number): number;
}

/** Makes the faces known to a document; every one is embedded as the subset that is used. */
export function registerFaces(doc: PdfDocument): void {
  for (const face of faceNames) {
    if (!bytes.has(face)) bytes.set(face, readFileSync(resolve(files[face])));
    doc.registerFont(face, bytes.get(face)!);
  }
}

/** A stretch of text whose every letter its face has. */
export interface Stretch {
  text: string;
  face: Face;
}

/** Measures text and finds a face for every letter; one for each document. */
export class Faces {
  readonly #doc: PdfDocument;
  readonly #fonts = new Map<Face, OpenFont>();
  readonly #widths = new Map<string, number>();

  constructor(doc: PdfDocument) {
    this.#doc = doc;
  }

  /** Width in points of a text whose letters the face has. */
  widthOf(text: string, face: Face, size: number): number {
    const key = `${face}\n${text}`;
    let width = this.#widths.get(key);
    if (width === undefined) {
      width = this.#open(face).widthOfString(text, 1000);
      this.#widths.set(key, width);
    }
    return (width * size) / 1000;
  }

  has(letter: string, face: Face): boolean {
    return this.#open(face).font.hasGlyphForCodePoint(letter.codePointAt(0)!);
  }

  /** Outlines of letters side by side, in units of which an em has `unitsPerEm`, y upwards: for letters that are a drawing. */
  outlines(text: string, face: Face): { unitsPerEm: number; width: number; letters: { x: number; path: string }[] } {
    const { font } = this.#open(face);
    let x = 0;
    const letters = font.layout(text).glyphs.map(({ advanceWidth, path }) => {
      const letter = { x, path: path.toSVG() };
      x += advanceWidth;
      return letter;
    });
    return { unitsPerEm: font.unitsPerEm, width: x, letters };
  }

  /**
   * Splits a text into stretches that can be printed. A letter that no face has is written as its code, [U+4E2D], so that
   * it is seen to be there; the attached content holds it as it was typed.
   */
  stretches(text: string, face: Face): Stretch[] {
    const letters = [...withoutControls(text)];
    const stretches: Stretch[] = [];
    for (const [index, letter] of letters.entries()) {
      const found = this.#faceFor(letters, index, face);
      const printed = found === null ? codeOf(letter) : letter;
      const last = stretches.at(-1);
      if (last && last.face === (found ?? face)) last.text += printed;
      else stretches.push({ text: printed, face: found ?? face });
    }
    return stretches;
  }

  #faceFor(letters: readonly string[], index: number, face: Face): Face | null {
    const letter = letters[index]!;
    // A thin space is as wide as a figure in the face of figures: it would part a number in two.
    if (letter === '\u2009' && (face === 'figures' || face === 'figures-strong')) return 'text';
    // The faces of text have some Greek letters and not others: a word is set in one face.
    const inWord = isGreek(letter) && [index - 1, index + 1].some((other) => isGreek(letters[other]));
    if (inWord && this.has(letter, 'fallback')) return 'fallback';
    if (this.has(letter, face)) return face;
    const candidates = substitutes[face].filter((other) => this.has(letter, other));
    // A lone Greek letter is the symbol of a quantity and set in italics; everything else stands upright.
    return (isGreek(letter) ? candidates[0] : (candidates.find((other) => other !== 'symbol') ?? candidates[0])) ?? null;
  }

  #open(face: Face): OpenFont {
    let font = this.#fonts.get(face);
    if (!font) {
      this.#doc.font(face);
      font = (this.#doc as unknown as { _font: OpenFont })._font;
      this.#fonts.set(face, font);
    }
    return font;
  }
}

function isGreek(letter: string | undefined): boolean {
  return letter !== undefined && /\p{Script=Greek}/u.test(letter) && /\p{L}/u.test(letter);
}

function codeOf(letter: string): string {
  return `[U+${letter.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}]`;
}

/** Composed letters, and neither control characters nor marks that only steer a line of text. */
function withoutControls(text: string): string {
  return text
    .normalize('NFC')
    .replace(/[\t\u202F\u2007]/g, (space) => (space === '\t' ? ' ' : '\u2009'))
    .replace(/\p{Cc}|[\u200B-\u200F\u202A-\u202E\u2060-\u2064\u2066-\u2069\uFEFF\u00AD]|[\uFE00-\uFE0F]/gu, '');
}
