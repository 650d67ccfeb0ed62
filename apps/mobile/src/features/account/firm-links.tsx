import type { Role } from '@strandnote/api/contract';
import { hasRole, type Membership } from '../../lib/session.tsx';
import { Link, Row } from '../../ui/index.ts';

const links: readonly { label: string; path: string; roles: readonly Role[] }[] = [
  { label: 'Firm', path: 'firm', roles: ['admin'] },
  { label: 'People', path: 'firm/members', roles: ['admin'] },
  { label: 'Clients', path: 'clients', roles: ['admin', 'engineer'] },
  { label: 'Audit trail', path: 'firm/audit', roles: ['admin', 'engineer', 'checker'] },
];

/** What is looked after once in a while, apart from the daily places. */
export function FirmLinks({ firm }: { firm: Membership }) {
  return (
    <Row gap={5}>
      {links
        .filter(({ roles }) => hasRole(firm, ...roles))
        .map(({ label, path }) => (
          <Link key={path} href={`/${firm.firmId}/${path}`}>
            {label}
          </Link>
        ))}
    </Row>
  );
}
