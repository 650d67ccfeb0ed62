import type { Role } from '@strandnote/api/contract';
import { hasRole, type Membership } from '../../lib/session.tsx';

interface Place {
  label: string;
  path: string;
  roles: readonly Role[];
}

const staff = ['admin', 'engineer', 'checker'] as const;

/** The five places, each shown to those who have something to do there. */
const places: readonly Place[] = [
  { label: 'Desk', path: 'desk', roles: staff },
  { label: 'Structures', path: 'structures', roles: staff },
  { label: 'Site', path: 'site', roles: ['engineer'] },
  { label: 'Checking', path: 'checking', roles: ['checker'] },
  { label: 'Issued', path: 'issued', roles: [...staff, 'client'] },
];

export function placesOf(membership: Membership): Place[] {
  return places.filter((place) => hasRole(membership, ...place.roles));
}

/** Where a person begins in a firm: at the desk, or, for a client, at what was issued to them. */
export function homeOf(membership: Membership): string {
  return `/${membership.firmId}/${placesOf(membership)[0]?.path ?? 'issued'}`;
}
