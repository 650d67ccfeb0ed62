import type { CampaignDetail } from '@strandnote/api/contract';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button } from '../../ui/index.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import type { SaveEntry } from './use-save-entry.ts';

interface SaveActionProps {
  survey: CampaignDetail;
  /** Whether there is anything to save. */
  filled: boolean;
  /** Changed since it was saved. */
  typed: boolean;
  /** Left out of the survey with a reason. */
  excused: boolean;
  saving: SaveEntry;
  next: ChecklistRow | null;
  nextHref: string;
}

/** The one main action: it saves, and goes where work waits. */
export function SaveAction({ survey, filled, typed, excused, saving, next, nextHref }: SaveActionProps) {
  const firm = useFirm();
  const destination = next ? next.name : 'the list';
  if (!typed && (filled || excused)) {
    return (
      <Button kind="primary" href={nextHref}>
        {`Go to ${destination}`}
      </Button>
    );
  }
  const why = whyNot({ closed: survey.state === 'closed', engineer: hasRole(firm, 'engineer'), filled });
  return (
    <Button kind="primary" onPress={() => void saving.save()} why={why}>
      {`Save and go to ${destination}`}
    </Button>
  );
}

function whyNot({ closed, engineer, filled }: { closed: boolean; engineer: boolean; filled: boolean }): string | null {
  if (!engineer) return 'Measurements are entered by engineers.';
  if (closed) return 'The campaign is closed. Open it again to change anything in it.';
  return filled ? null : 'Type a frequency first, or say below why it is not measured.';
}
