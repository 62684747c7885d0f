import { equipmentViewSchema, type SaveEquipment } from '@shared/equipment';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { http } from '../../../lib/http.js';
import { bayQuery } from '../../../lib/job-records.js';

export const equipmentQuery = queryOptions({ queryKey: ['equipment'], queryFn: ({ signal }) => http.get('/equipment', equipmentViewSchema, { signal }) });

/** The bench and the burnouts choose from the same lists, so they ask again. */
export function useSaveEquipment() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: SaveEquipment) => http.put('/equipment', input, equipmentViewSchema),
    onSuccess: (saved) => {
      client.setQueryData(equipmentQuery.queryKey, saved);
      return client.invalidateQueries({ queryKey: bayQuery.queryKey });
    },
  });
}
