import { drawLine } from './draw-text.ts';
import { Faces } from './faces.ts';
import { ink } from './ink.ts';
import type { PdfDocument } from './pdf-document.ts';
import { balancedLines, type Inline, type Line, layoutLines, plainText, styles, type TextStyle } from './text-layout.ts';

/** A structure element of a tagged document. pdfkit's types leave out what this report needs of it. */
export interface Element {
  add(child: Element | (() => void)): Element;
  end(): void;
}
export interface ElementOptions {
  title?: string;
  alt?: string;
  actual?: string;
  scope?: 'Column' | 'Row' | 'Both';
  bbox?: [number, number, number, number];
}

/** Room for content on each page (points, y downwards). */
export interface Room {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface Landmark {
  level: 1 | 2;
  title: string;
  page: number;
  /** Name of the destination in the document. */
  name: string;
}

/** Sets a report from top to bottom: knows where on which page the next thing goes and under which element it belongs. */
export class Sheet {
  readonly doc: PdfDocument;
  readonly faces: Faces;
  readonly room: Room;
  readonly landmarks: Landmark[] = [];
  y = 0;
  /** What the head of the pages to come names besides the survey. */
  running = '';
  /** What new elements are added to. */
  parent: Element;
  readonly #root: Element;
  readonly #onPage: (page: number) => void;
  #pages = 0;
  readonly #later: { page: number; element: Element; draw: (pageOf: (name: string) => number) => void }[] = [];

  constructor(doc: PdfDocument, room: Room, onPage: (page: number) => void) {
    this.doc = doc;
    this.room = room;
    this.faces = new Faces(doc);
    this.#onPage = onPage;
    this.#root = this.element('Document');
    doc.addStructure(this.#root as never);
    this.parent = this.#root;
  }

  get width(): number {
    return this.room.right - this.room.left;
  }

  get pages(): number {
    return this.#pages;
  }

  get left(): number {
    return this.room.left;
  }

  newPage(): void {
    this.doc.addPage();
    this.#pages += 1;
    this.y = this.room.top;
    this.#onPage(this.#pages);
  }

  /** Begins a new page unless there is room for so much more on this one. */
  need(height: number): void {
    if (this.#pages === 0 || this.y + height > this.room.bottom + 0.01) this.newPage();
  }

  space(height: number): void {
    this.y += height;
  }

  /** A new element, not yet part of the document. */
  element(type: string, options: ElementOptions = {}): Element {
    return this.doc.struct(type, options as never) as unknown as Element;
  }

  /** Adds an element to the current parent; what it draws is its content. */
  tag(type: string, options: ElementOptions = {}, draw?: () => void, parent: Element = this.parent): Element {
    const element = this.element(type, options);
    parent.add(element);
    if (draw) element.add(draw);
    return element;
  }

  /** Draws what is no content: rules, frames, repeated headings. */
  artifact(draw: () => void, type: 'Layout' | 'Pagination' = 'Layout'): void {
    this.doc.markContent('Artifact', { type } as never);
    draw();
    this.doc.endMarkedContent();
  }

  /** Everything that is set meanwhile belongs to a section. */
  section(set: () => void): void {
    const outer = this.parent;
    this.parent = this.tag('Sect');
    set();
    this.parent = outer;
  }

  heading(
    level: 1 | 2 | 3,
    title: Inline,
    { keep = 60, style = headingStyles[level], name }: { keep?: number; style?: TextStyle; name?: string } = {},
  ): void {
    const lines = level === 1 ? balancedLines(this.faces, title, style, this.width) : layoutLines(this.faces, title, style, this.width);
    const height = lines.length * style.size * style.leading;
    const before = this.y > this.room.top ? spaceBefore[level] : 0;
    this.need(before + height + keep);
    if (this.y > this.room.top) this.y += before;
    if (level < 3) this.landmark(level as 1 | 2, plainText(title), name);
    this.tag(`H${level}`, { title: plainText(title) }, () => this.lines(lines, style));
    this.y += spaceAfter[level];
  }

  /** Remembers a place for the list of contents, the bookmarks and links. */
  landmark(level: 1 | 2, title: string, name = `place-${String(this.landmarks.length + 1).padStart(4, '0')}`): Landmark {
    const landmark = { level, title, page: this.#pages, name };
    this.landmarks.push(landmark);
    this.doc.addNamedDestination(landmark.name, 'XYZ', this.left as never, (this.y - 4) as never, null as never);
    return landmark;
  }

  /** A paragraph over as many pages as it needs; line breaks in its text begin new lines. */
  paragraph(
    text: Inline,
    style: TextStyle = styles.body,
    { after = 5, indent = 0, width = this.width }: { after?: number; indent?: number; width?: number } = {},
  ): void {
    const element = this.tag('P');
    let rest = layoutLines(this.faces, text, style, width - indent);
    const step = style.size * style.leading;
    while (rest.length > 0) {
      this.need(step * Math.min(2, rest.length));
      const fitting = Math.max(1, Math.floor((this.room.bottom - this.y + 0.01) / step));
      const now = rest.slice(0, fitting);
      element.add(() => this.lines(now, style, this.left + indent));
      rest = rest.slice(fitting);
    }
    this.y += after;
  }

  /** Draws lines downwards from the present place. */
  lines(lines: readonly Line[], style: TextStyle, x = this.left): void {
    for (const line of lines) {
      drawLine(this.doc, line, x, this.y + baseline(style));
      this.y += style.size * style.leading;
    }
  }

  /** One line of text at a place of its own, without moving on. */
  textAt(
    text: Inline,
    x: number,
    y: number,
    style: TextStyle,
    { align = 'left', width = 0 }: { align?: 'left' | 'right' | 'center'; width?: number } = {},
  ): void {
    const [line] = layoutLines(this.faces, text, style);
    const shift = align === 'right' ? width - line!.width : align === 'center' ? (width - line!.width) / 2 : 0;
    drawLine(this.doc, line!, x + shift, y + baseline(style));
  }

  rule(x1: number, x2: number, y: number, weight = 0.4, colour = ink.line): void {
    this.doc.moveTo(x1, y).lineTo(x2, y).lineWidth(weight).strokeColor(colour).stroke();
  }

  /** Content that leads to another place of the document. */
  link(
    parent: Element,
    destination: string,
    words: string,
    [x, y, width, height]: [number, number, number, number],
    draw: () => void,
  ): void {
    const link = this.tag('Link', {}, undefined, parent);
    link.add(() => {
      draw();
      this.doc.goTo(x, y, width, height, destination, { structParent: link, Contents: Object(words) } as never);
    });
    // pdfkit notes the page of a link when its element ends: it has to end on its own page.
    link.end();
  }

  /** Content that needs to know on which page another place came to lie; it is drawn when everything else is set. */
  later(element: Element, draw: (pageOf: (name: string) => number) => void): void {
    this.#later.push({ page: this.#pages, element, draw });
  }

  /** Draws what had to wait, and closes the structure of the document. */
  end(): void {
    const pageOf = (name: string) => this.landmarks.find((landmark) => landmark.name === name)!.page;
    for (const { page, element, draw } of this.#later) {
      this.doc.switchToPage(page - 1);
      element.add(() => draw(pageOf));
    }
    this.#root.end();
  }
}

/** Distance from the top of a line to its baseline. */
export function baseline({ size, leading }: TextStyle): number {
  return size * (leading / 2 + 0.33);
}

const headingStyles: Record<1 | 2 | 3, TextStyle> = { 1: styles.title, 2: styles.h2, 3: styles.h3 };
const spaceBefore = { 1: 0, 2: 16, 3: 10 };
const spaceAfter = { 1: 4, 2: 6, 3: 3 };
