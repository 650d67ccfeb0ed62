import type { Role } from '@strandnote/api/contract';
import type { Actor } from '@strandnote/db';
import { AppError } from '../http/errors.ts';

/** Who may do what. Every route names its act; every command asks again. */
export const permissions = {
  'firm.read': ['admin', 'engineer', 'checker', 'client'],
  'firm.edit': ['admin'],
  'member.read': ['admin', 'engineer', 'checker'],
  'member.self': ['admin', 'engineer', 'checker', 'client'],
  'member.invite': ['admin'],
  'member.edit': ['admin'],
  'client.read': ['admin', 'engineer', 'checker'],
  'client.edit': ['admin', 'engineer'],
  'structure.read': ['admin', 'engineer', 'checker'],
  'structure.edit': ['admin', 'engineer'],
  'campaign.read': ['admin', 'engineer', 'checker'],
  'campaign.edit': ['engineer'],
  'report.read': ['admin', 'engineer', 'checker'],
  'report.write': ['engineer'],
  'report.discuss': ['engineer', 'checker'],
  'revision.check': ['checker'],
  'revision.issue': ['engineer'],
  'revision.withdraw': ['engineer'],
  'issued.read': ['admin', 'engineer', 'checker', 'client'],
  'desk.read': ['admin', 'engineer', 'checker'],
  'audit.read': ['admin', 'engineer', 'checker'],
  'audit.verify': ['admin'],
} as const satisfies Record<string, readonly Role[]>;

export type Act = keyof typeof permissions;

export function can(actor: Pick<Actor, 'roles'>, act: Act): boolean {
  const allowed: readonly Role[] = permissions[act];
  return actor.roles.some((role) => allowed.includes(role));
}

/** @throws AppError `forbidden` when none of the member's roles allows the act */
export function assertCan(actor: Pick<Actor, 'roles'>, act: Act): void {
  if (!can(actor, act)) throw new AppError('forbidden', `This takes the role of ${permissions[act].join(' or ')}.`);
}
