import { verification } from '@strandnote/api/contract';
import { useQuery } from '@tanstack/react-query';
import { get } from '../../lib/api-client.ts';

/** @param key the code printed in the report, or the SHA-256 of its PDF; null asks nothing */
export function useVerificationQuery(key: string | null) {
  return useQuery({
    queryKey: ['verification', key],
    queryFn: ({ signal }) => get(`/verification/${encodeURIComponent(key ?? '')}`, verification, signal),
    enabled: key !== null,
    // Whether a report is current is asked anew each time.
    staleTime: 0,
    gcTime: 0,
  });
}
