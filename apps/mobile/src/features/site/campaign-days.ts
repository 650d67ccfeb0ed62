import type { Campaign } from '@strandnote/api/contract';
import { showDay } from '../../lib/show-time.ts';

/** "1 Dec 2026 to 3 Dec 2026". */
export function daysOf({ startsOn, endsOn }: Pick<Campaign, 'startsOn' | 'endsOn'>): string {
  return endsOn === null || endsOn === startsOn ? showDay(startsOn) : `${showDay(startsOn)} to ${showDay(endsOn)}`;
}
