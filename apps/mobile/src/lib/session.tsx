import { type Me, me as meSchema, type Role } from '@strandnote/api/contract';
import { useQuery } from '@tanstack/react-query';
import { createContext, type ReactNode, use } from 'react';
import { get } from './api-client.ts';
import { ApiProblem } from './api-problem.ts';
import { meKey } from './query-client.ts';
import { UnitsProvider } from './units.tsx';

export type Membership = Me['firms'][number];

/** The person signed in; null when nobody is. */
export function useMeQuery() {
  return useQuery({
    queryKey: meKey,
    queryFn: async ({ signal }): Promise<Me | null> => {
      try {
        return await get('/me', meSchema, signal);
      } catch (error) {
        if (error instanceof ApiProblem && error.kind === 'signed-out') return null;
        throw error;
      }
    },
    staleTime: 60_000,
  });
}

const FirmContext = createContext<Membership | null>(null);

/** Everything below the address of a firm: who the person is there, and in which units they read. */
export function FirmProvider({ membership, children }: { membership: Membership; children: ReactNode }) {
  return (
    <FirmContext value={membership}>
      <UnitsProvider system={membership.units}>{children}</UnitsProvider>
    </FirmContext>
  );
}

/** The person's membership in the firm of the address. */
export function useFirm(): Membership {
  const membership = use(FirmContext);
  if (!membership) throw new Error('useFirm is used outside the routes of a firm.');
  return membership;
}

/** For what is shown, never for what is allowed: the server decides that. */
export function hasRole(membership: Membership, ...roles: Role[]): boolean {
  return roles.some((role) => membership.roles.includes(role));
}
