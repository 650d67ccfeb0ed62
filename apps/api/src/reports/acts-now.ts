import type { May, RevisionAct, RevisionState, Role } from '@strandnote/api/contract';

/** What decides which acts on a revision a member may do now. */
export interface RevisionSituation {
  state: RevisionState;
  isLatest: boolean;
  roles: Role[];
  isAuthorOrDeputy: boolean;
  /** Why the member cannot check this submission: they prepared part of it. Null where they did not. */
  ownWork: string | null;
  blockerCount: number;
  cableCount: number;
  tickedCount: number;
  openRemarkCount: number;
  pdfReady: boolean;
}

const actsOfRole: Partial<Record<Role, RevisionAct[]>> = {
  engineer: ['edit', 'submit', 'recall', 'answer', 'issue', 'withdraw', 'start-next-revision'],
  checker: ['tick', 'remark', 'return', 'approve'],
};

/**
 * Each act of the member's roles with null where it is allowed now, or a sentence that says why not. The same sentences
 * refuse the act when it is tried, so that a screen and the server never disagree.
 */
export function actsNow(situation: RevisionSituation): May {
  const acts = situation.roles.flatMap((role) => actsOfRole[role] ?? []);
  return Object.fromEntries(acts.map((act) => [act, whyNot(act, situation)]));
}

/** Why an act cannot be done now, in a sentence; null when it can. Roles are not asked here. */
export function whyNot(act: RevisionAct, situation: RevisionSituation): string | null {
  return reasons[act](situation);
}

export const authorOnly = 'Only the author or the deputy named by the author can do this.';
const reasons: Record<RevisionAct, (situation: RevisionSituation) => string | null> = {
  edit: ({ state }) => (isOpen(state) ? null : notWhile(state, 'its texts are frozen')),
  submit: (situation) => {
    if (!isOpen(situation.state)) return notWhile(situation.state, 'it cannot be submitted');
    if (!situation.isAuthorOrDeputy) return authorOnly;
    if (situation.blockerCount === 0) return null;
    return situation.blockerCount === 1
      ? 'One thing stands in the way of submitting.'
      : `${situation.blockerCount} things stand in the way of submitting.`;
  },
  recall: ({ state, isAuthorOrDeputy }) => {
    if (state !== 'in check') return notWhile(state, 'there is nothing to recall');
    return isAuthorOrDeputy ? null : authorOnly;
  },
  answer: ({ state }) => (['in check', 'returned', 'draft'].includes(state) ? null : notWhile(state, 'its remarks are settled')),
  tick: checking,
  remark: checking,
  return: ({ state, ownWork }) => (state === 'in check' || state === 'approved' ? ownWork : notWhile(state, 'there is nothing to return')),
  approve: (situation) => checking(situation) ?? unfinishedCheck(situation),
  issue: ({ state, isAuthorOrDeputy, pdfReady }) => {
    if (state !== 'approved') return notWhile(state, 'it cannot be issued');
    if (!isAuthorOrDeputy) return authorOnly;
    return pdfReady ? null : 'The PDF is being rendered. It is ready in a few seconds.';
  },
  withdraw: ({ state, isAuthorOrDeputy }) => {
    if (state !== 'issued' && state !== 'superseded') return notWhile(state, 'there is nothing to withdraw');
    return isAuthorOrDeputy ? null : authorOnly;
  },
  'start-next-revision': ({ state, isLatest }) => {
    if (!isLatest) return 'A later revision exists already.';
    return state === 'issued' || state === 'withdrawn' ? null : 'The next revision starts when this one is issued or withdrawn.';
  },
};

function isOpen(state: RevisionState): boolean {
  return state === 'draft' || state === 'returned';
}

function checking({ state, ownWork }: RevisionSituation): string | null {
  return state === 'in check' ? ownWork : notWhile(state, 'there is nothing to check');
}

function unfinishedCheck({ cableCount, tickedCount, openRemarkCount }: RevisionSituation): string | null {
  const left = cableCount - tickedCount;
  const parts = [
    ...(left > 0 ? [`${left} ${left === 1 ? 'cable' : 'cables'} to look at`] : []),
    ...(openRemarkCount > 0 ? [`${openRemarkCount} ${openRemarkCount === 1 ? 'remark' : 'remarks'} open`] : []),
  ];
  if (parts.length === 0) return null;
  const sentence = parts.join(', ');
  return `${sentence[0]!.toUpperCase()}${sentence.slice(1)}.`;
}

const stateInWords: Record<RevisionState, string> = {
  draft: 'a draft',
  'in check': 'in check',
  returned: 'returned',
  approved: 'approved',
  issued: 'issued',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

function notWhile(state: RevisionState, consequence: string): string {
  return `The revision is ${stateInWords[state]}, so ${consequence}.`;
}
