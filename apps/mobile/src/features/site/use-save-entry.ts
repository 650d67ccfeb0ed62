import type { PutMeasurement } from '@strandnote/api/contract';
import { useCallback, useEffect, useState } from 'react';
import { useFirm, useMeQuery } from '../../lib/session.tsx';
import { hasProblems } from './check-entry.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { saveMeasurement, saveReason } from './entry-store.ts';
import { measurementBody } from './measurement-body.ts';
import type { Entry, EntryPlace } from './use-entry.ts';

export type SaveEntry = ReturnType<typeof useSaveEntry>;

/** Puts what was typed on its way once nothing is wrong with it; otherwise leads to the first thing that is. */
export function useSaveEntry({ survey, row }: EntryPlace, entry: Entry, onSaved: () => void) {
  const firm = useFirm();
  const me = useMeQuery();
  const [tried, setTried] = useState(0);
  const [failure, setFailure] = useState<string | null>(null);
  const { draft, findings, forget, timeZone } = entry;
  useEffect(() => {
    if (tried > 0) showFirstProblem();
  }, [tried]);
  const send = useCallback(
    async (body: PutMeasurement) => {
      if (!me.data || !draft) return;
      const { userId, name } = me.data;
      const entered = { campaignId: survey.id, measurementId: draft.measurementId, cableName: row.name, body };
      try {
        await saveMeasurement({ firmId: firm.firmId, userId, name }, entered);
        // A cable that was measured after all no longer needs its excuse.
        if (row.entry.notMeasuredReason !== null) await saveReason({ firmId: firm.firmId, userId }, withoutReason(survey.id, row));
        await forget();
        onSaved();
      } catch (error) {
        console.error(error);
        setFailure('This browser did not let it be kept on the device. Leave the page open, and free some storage.');
      }
    },
    [me.data, draft, survey.id, row, firm.firmId, forget, onSaved],
  );
  const save = async () => {
    if (!draft || !findings) return;
    if (hasProblems(findings.problems)) setTried(tried + 1);
    else await send(measurementBody(draft, row.span, timeZone));
  };
  return { save, send, tried: tried > 0, failure };
}

function withoutReason(campaignId: string, { entry: { cable } }: ChecklistRow) {
  return { campaignId, cableId: cable.id, cableName: cable.reference, reason: null };
}

/** Whoever pressed the button stands at the foot of the page; what is to be mended may be far above. */
function showFirstProblem(): void {
  const wrong = document.querySelector<HTMLElement>('main [aria-invalid="true"], [role="main"] [aria-invalid="true"]');
  const control = wrong?.matches('input, select, textarea') ? wrong : wrong?.querySelector<HTMLElement>('[tabindex="0"]');
  control?.focus({ preventScroll: true });
  wrong?.scrollIntoView({ block: 'center' });
}
