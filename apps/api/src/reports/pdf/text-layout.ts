import type { Pigment } from '@strandnote/core/drawing';
import type { Face, Faces } from './faces.ts';

/** A stretch of text with its look; what is left out comes from the style of the whole. */
export interface Run {
  text: string;
  face?: Face;
  pigment?: Pigment;
  /** A subscript or superscript. */
  script?: 'sub' | 'sup';
}
/** Text as it is given to be set: plain, or in runs. */
export type Inline = string | readonly Run[];

export interface TextStyle {
  face: Face;
  size: number;
  /** Distance from line to line, in sizes. */
  leading: number;
  pigment: Pigment;
}

/** A stretch that is printed in one go. */
export interface Piece {
  text: string;
  face: Face;
  size: number;
  /** How far above the baseline, in points. */
  rise: number;
  width: number;
  pigment: Pigment;
}
export interface Line {
  pieces: Piece[];
  width: number;
}

export const styles = {
  body: { face: 'text', size: 9.5, leading: 1.4, pigment: 'ink' },
  strong: { face: 'text-strong', size: 9.5, leading: 1.4, pigment: 'ink' },
  note: { face: 'text', size: 8.5, leading: 1.35, pigment: 'muted' },
  noteInk: { face: 'text', size: 8.5, leading: 1.35, pigment: 'ink' },
  cell: { face: 'text', size: 8.5, leading: 1.25, pigment: 'ink' },
  head: { face: 'text', size: 8, leading: 1.2, pigment: 'muted' },
  figure: { face: 'figures', size: 8.5, leading: 1.25, pigment: 'ink' },
  title: { face: 'text-strong', size: 20, leading: 1.15, pigment: 'ink' },
  h2: { face: 'text-strong', size: 14, leading: 1.2, pigment: 'ink' },
  h3: { face: 'text-strong', size: 10.5, leading: 1.25, pigment: 'ink' },
} as const satisfies Record<string, TextStyle>;

/** Symbols between braces, subscripts after _ and superscripts after ^, bold between asterisks: for the report's own sentences only. */
export function marked(text: string): Run[] {
  const pattern = /\{([^}]*)\}|_\(([^)]*)\)|\^\(([^)]*)\)|\*([^*]*)\*|([^{_^*]+|[_^*])/g;
  return [...text.matchAll(pattern)].map(([, symbol, sub, sup, bold, plain]): Run => {
    if (symbol !== undefined) return { text: symbol, face: 'symbol' };
    if (sub !== undefined) return { text: sub, script: 'sub', face: 'symbol' };
    if (sup !== undefined) return { text: sup, script: 'sup' };
    if (bold !== undefined) return { text: bold, face: 'text-strong' };
    return { text: plain! };
  });
}

/** The words of a text without their look. */
export function plainText(inline: Inline): string {
  return typeof inline === 'string' ? inline : inline.map(({ text }) => text).join('');
}

/**
 * Breaks a text into lines. Words stay whole where they fit on a line of their own; a thin space holds its number together.
 *
 * @param width in points; infinite for a single line
 * @returns one line at least; a line break in the text begins a new one
 */
export function layoutLines(faces: Faces, inline: Inline, style: TextStyle, width = Number.POSITIVE_INFINITY): Line[] {
  const runs = typeof inline === 'string' ? [{ text: inline }] : inline;
  const lines: Line[] = [{ pieces: [], width: 0 }];
  for (const word of words(faces, runs, style)) {
    if (word.kind === 'break') {
      lines.push({ pieces: [], width: 0 });
      continue;
    }
    for (const part of word.width > width ? shortened(faces, word, width) : [word]) {
      const line = lines.at(-1)!;
      const space = line.pieces.length > 0 ? part.space : 0;
      if (line.pieces.length > 0 && line.width + space + part.width > width + 0.01)
        lines.push({ pieces: [...part.pieces], width: part.width });
      else append(line, part, space);
    }
  }
  return lines;
}

/** The same lines of about one length: no word is left alone on the last. */
export function balancedLines(faces: Faces, inline: Inline, style: TextStyle, width: number): Line[] {
  let lines = layoutLines(faces, inline, style, width);
  for (let narrower = width - 10; narrower > width / 2; narrower -= 10) {
    const tried = layoutLines(faces, inline, style, narrower);
    if (tried.length > lines.length) break;
    lines = tried;
  }
  return lines;
}

interface Word {
  kind: 'word';
  pieces: Piece[];
  width: number;
  /** Width of the space before it; 0 where it is glued to the word before. */
  space: number;
}

function append(line: Line, part: Word, space: number): void {
  const last = line.pieces.at(-1);
  if (space > 0 && last) {
    last.text += ' ';
    last.width += space;
  }
  for (const piece of part.pieces) {
    const before = line.pieces.at(-1);
    if (before && looksLike(before, piece)) {
      before.text += piece.text;
      before.width += piece.width;
    } else line.pieces.push({ ...piece });
  }
  line.width += space + part.width;
}

function looksLike(a: Piece, b: Piece): boolean {
  return a.face === b.face && a.size === b.size && a.rise === b.rise && a.pigment === b.pigment;
}

/** Words may run over several faces: the pieces between two spaces belong together. */
function* words(faces: Faces, runs: readonly Run[], style: TextStyle): Generator<Word | { kind: 'break' }> {
  let word: Word = { kind: 'word', pieces: [], width: 0, space: 0 };
  const flush = function* (): Generator<Word> {
    if (word.pieces.length > 0) yield word;
  };
  for (const run of runs) {
    for (const token of run.text.split(/(\r?\n| +)/)) {
      if (token === '') continue;
      if (/^( +|\r?\n)$/.test(token)) {
        yield* flush();
        if (token.includes('\n')) yield { kind: 'break' };
        word = { kind: 'word', pieces: [], width: 0, space: token.includes('\n') ? 0 : faces.widthOf(' ', style.face, style.size) };
        continue;
      }
      const pieces = piecesOf(faces, token, run, style);
      word.pieces.push(...pieces);
      word.width += pieces.reduce((sum, { width }) => sum + width, 0);
    }
  }
  yield* flush();
}

function piecesOf(faces: Faces, token: string, run: Run, style: TextStyle): Piece[] {
  const size = run.script ? style.size * 0.72 : style.size;
  const rise = run.script === 'sub' ? -style.size * 0.18 : run.script === 'sup' ? style.size * 0.36 : 0;
  return faces.stretches(token, run.face ?? style.face).map(({ text, face }) => {
    // STIX is drawn smaller on its body than Atkinson.
    const scaled = face === 'symbol' || face === 'fallback' ? size * 1.08 : size;
    return { text, face, size: scaled, rise, width: faces.widthOf(text, face, scaled), pigment: run.pigment ?? style.pigment };
  });
}

/** A word longer than the line, such as a hash, in parts that fit. */
function shortened(faces: Faces, word: Word, width: number): Word[] {
  const parts: Word[] = [{ kind: 'word', pieces: [], width: 0, space: word.space }];
  for (const piece of word.pieces) {
    for (const letter of piece.text) {
      const letterWidth = faces.widthOf(letter, piece.face, piece.size);
      if (parts.at(-1)!.width + letterWidth > width && parts.at(-1)!.pieces.length > 0) {
        parts.push({ kind: 'word', pieces: [], width: 0, space: 0 });
      }
      const part = parts.at(-1)!;
      const last = part.pieces.at(-1);
      if (last && last.face === piece.face && last.rise === piece.rise) last.text += letter;
      else part.pieces.push({ ...piece, text: letter });
      part.width += letterWidth;
    }
  }
  for (const part of parts) for (const piece of part.pieces) piece.width = faces.widthOf(piece.text, piece.face, piece.size);
  return parts;
}
