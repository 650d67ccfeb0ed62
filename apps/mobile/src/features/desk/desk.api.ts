import { desk } from '@strandnote/api/contract';
import { useQuery } from '@tanstack/react-query';
import { firmPath, get } from '../../lib/api-client.ts';

export function useDeskQuery(firmId: string) {
  return useQuery({ queryKey: ['firm', firmId, 'desk'], queryFn: ({ signal }) => get(firmPath(firmId, 'desk'), desk, signal) });
}
