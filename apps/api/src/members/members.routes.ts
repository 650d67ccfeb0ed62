import {
  acceptInvitation as acceptInvitationBody,
  done,
  editMe as editMeBody,
  editMember as editMemberBody,
  id,
  invitationByToken,
  invitationList,
  invite,
  memberList,
} from '@strandnote/api/contract';
import { withFirm } from '@strandnote/db';
import { z } from 'zod';
import { firmRoute, publicRoute } from '../http/route.ts';
import { acceptInvitation, showInvitation } from './accept-invitation.ts';
import { editMe, editMember, revokeInvitation } from './edit-member.ts';
import { inviteMember } from './invite-member.ts';
import { listInvitations, listMembers } from './members.queries.ts';

const token = z.object({ token: z.string().min(16).max(100) });

export const memberRoutes = [
  firmRoute({
    method: 'get',
    path: '/members',
    access: 'member.read',
    summary: 'People of the firm',
    reply: memberList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listMembers(tx) })),
  }),
  firmRoute({
    method: 'patch',
    path: '/members/me',
    access: 'member.self',
    summary: 'Changes units and licence of the member who asks',
    body: editMeBody,
    reply: done,
    handle: async ({ deps, who, body }) => {
      await editMe(deps, who, body);
      return { done: true } as const;
    },
  }),
  firmRoute({
    method: 'patch',
    path: '/members/:memberId',
    access: 'member.edit',
    summary: 'Changes roles, or whether a member is active',
    params: z.object({ memberId: id }),
    body: editMemberBody,
    reply: memberList,
    handle: async ({ deps, who, params, body }) => {
      await editMember(deps, who, params.memberId, body);
      return withFirm(deps.db, who, async (tx) => ({ items: await listMembers(tx) }));
    },
  }),
  firmRoute({
    method: 'get',
    path: '/invitations',
    access: 'member.invite',
    summary: 'Invitations and what became of them',
    reply: invitationList,
    handle: ({ deps, who }) => withFirm(deps.db, who, async (tx) => ({ items: await listInvitations(tx, deps.clock()) })),
  }),
  firmRoute({
    method: 'post',
    path: '/invitations',
    access: 'member.invite',
    summary: 'Invites a person by mail',
    body: invite,
    reply: invitationList,
    status: 201,
    handle: async ({ deps, who, body }) => {
      await inviteMember(deps, who, body);
      return withFirm(deps.db, who, async (tx) => ({ items: await listInvitations(tx, deps.clock()) }));
    },
  }),
  firmRoute({
    method: 'delete',
    path: '/invitations/:invitationId',
    access: 'member.invite',
    summary: 'Revokes an invitation that was not accepted',
    params: z.object({ invitationId: id }),
    reply: done,
    handle: async ({ deps, who, params }) => {
      await revokeInvitation(deps, who, params.invitationId);
      return { done: true } as const;
    },
  }),
  publicRoute({
    method: 'get',
    path: '/invitations/:token',
    summary: 'What an invitation offers, to the person who holds its link',
    params: token,
    reply: invitationByToken,
    perMinute: 30,
    handle: ({ deps, params }) => showInvitation(deps, params.token),
  }),
  publicRoute({
    method: 'post',
    path: '/invitations/:token/acceptance',
    summary: 'Accepts an invitation, with a password for the new account or that of the account there is',
    params: token,
    body: acceptInvitationBody,
    reply: done,
    perMinute: 10,
    handle: async ({ deps, params, body }) => {
      await acceptInvitation(deps, params.token, body);
      return { done: true } as const;
    },
  }),
];
