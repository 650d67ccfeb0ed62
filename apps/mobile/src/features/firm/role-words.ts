import type { Invitation, Role } from '@strandnote/api/contract';

export const roleWords: Record<Role, { label: string; hint: string }> = {
  admin: { label: 'Administrator', hint: 'People, letterhead, clients and the whole audit trail' },
  engineer: { label: 'Engineer', hint: 'Surveys, writes and issues reports' },
  checker: { label: 'Checker', hint: 'Checks and approves what others wrote' },
  client: { label: 'Client', hint: 'Sees only what was issued to one client organisation' },
};

export const invitationWords: Record<Invitation['state'], string> = {
  open: 'not answered yet',
  accepted: 'accepted',
  revoked: 'revoked',
  expired: 'too old',
};

/** "administrator, engineer"; for a client also of which organisation. */
export function rolesText(roles: readonly Role[], clientName: string | null): string {
  const words = roles.map((role) => roleWords[role].label.toLowerCase()).join(', ');
  return clientName === null ? words : `${words} of ${clientName}`;
}

/** The roles after one was ticked or cleared: client stands alone. */
export function withRole(roles: readonly Role[], role: Role, ticked: boolean): Role[] {
  if (!ticked) return roles.filter((held) => held !== role);
  return role === 'client' ? ['client'] : [...roles.filter((held) => held !== 'client' && held !== role), role];
}
