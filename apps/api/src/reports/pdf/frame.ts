import type { Room } from './sheet.ts';

const mm = 72 / 25.4;

/** Where the frame of a drawing sheet runs: a filing margin at the left, 10 mm elsewhere (in the manner of ISO 5457). */
export interface Frame {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** Height of the title block at the foot, and of the line at the head that carries marks. */
export const titleBlockHeight = 46;
const headHeight = 22;
const padding = 14;

export function frameOf(page: { width: number; height: number }): Frame {
  return { left: 20 * mm, right: page.width - 10 * mm, top: 10 * mm, bottom: page.height - 10 * mm };
}

/** What the frame leaves for content. */
export function roomWithin({ left, right, top, bottom }: Frame): Room {
  return { left: left + padding, right: right - padding, top: top + headHeight + 8, bottom: bottom - titleBlockHeight - 10 };
}
