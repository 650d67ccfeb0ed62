import { issuedDetail, issuedList } from '@strandnote/api/contract';
import { useQuery } from '@tanstack/react-query';
import { firmPath, get } from '../../lib/api-client.ts';

export function useIssuedQuery(firmId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'issued'],
    queryFn: ({ signal }) => get(firmPath(firmId, 'issued'), issuedList, signal),
  });
}

export function useIssuedReportQuery(firmId: string, revisionId: string) {
  return useQuery({
    queryKey: ['firm', firmId, 'issued', revisionId],
    queryFn: ({ signal }) => get(firmPath(firmId, 'issued', revisionId), issuedDetail, signal),
  });
}
