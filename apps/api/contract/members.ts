import { z } from 'zod';
import { emailAddress, id, isoTime, listOf, typedText } from './primitives.ts';

export const role = z.enum(['admin', 'engineer', 'checker', 'client']);
export type Role = z.infer<typeof role>;

export const unitSystem = z.enum(['si', 'us']);
export type UnitSystem = z.infer<typeof unitSystem>;

/** A client sees only what was issued to their organisation, so that role stands alone and names it. */
const rolesWithClient = <Shape extends { roles: Role[]; clientId: string | null }>(member: Shape) =>
  member.roles.includes('client') ? member.roles.length === 1 && member.clientId !== null : member.clientId === null;
const rolesRule = {
  path: ['roles'],
  message: 'Client stands alone and needs the client organisation; the other roles belong to no client.',
};

export const member = z.object({
  id,
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  clientId: id.nullable(),
  licenceNumber: z.string(),
  licenceJurisdiction: z.string(),
  units: unitSystem,
  active: z.boolean(),
});
export type Member = z.infer<typeof member>;
export const memberList = listOf(member);

export const editMember = z
  .strictObject({ roles: z.array(role).min(1, 'Choose at least one role.'), clientId: id.nullable(), active: z.boolean() })
  .refine(rolesWithClient, rolesRule);
export type EditMember = z.infer<typeof editMember>;

export const editMe = z
  .strictObject({ units: unitSystem, licenceNumber: z.string().trim().max(80), licenceJurisdiction: z.string().trim().max(80) })
  .partial();
export type EditMe = z.infer<typeof editMe>;

export const invite = z
  .strictObject({
    id,
    name: typedText(120),
    email: emailAddress,
    roles: z.array(role).min(1, 'Choose at least one role.'),
    clientId: id.nullable(),
  })
  .refine(rolesWithClient, rolesRule);
export type Invite = z.infer<typeof invite>;

export const invitation = z.object({
  id,
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  clientId: id.nullable(),
  expiresAt: isoTime,
  state: z.enum(['open', 'accepted', 'revoked', 'expired']),
});
export type Invitation = z.infer<typeof invitation>;
export const invitationList = listOf(invitation);

/** What a person who opens an invitation's link is shown before they accept. */
export const invitationByToken = z.object({
  firmName: z.string(),
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  hasAccount: z.boolean(),
});
export type InvitationByToken = z.infer<typeof invitationByToken>;

export const acceptInvitation = z.strictObject({
  password: z.string().min(12, 'A password has at least 12 characters.').max(128, 'At most 128 characters.'),
});
export type AcceptInvitation = z.infer<typeof acceptInvitation>;

/** The person signed in, with the firms that they belong to. */
export const me = z.object({
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  firms: z.array(
    z.object({
      firmId: id,
      firmName: z.string(),
      timeZone: z.string(),
      demonstration: z.boolean(),
      memberId: id,
      roles: z.array(role),
      clientId: id.nullable(),
      clientName: z.string().nullable(),
      units: unitSystem,
      licenceNumber: z.string(),
      licenceJurisdiction: z.string(),
    }),
  ),
});
export type Me = z.infer<typeof me>;
