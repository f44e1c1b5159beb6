import { useMutation, useQueryClient } from '@tanstack/react-query';
import { studyDetailSchema } from '../../../../shared/contracts/studies.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Stops a study that has not finished; nothing of it is kept. */
export function useCancelStudy(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () =>
      callApi(studyDetailSchema, `/studies/${studyId}/cancel`, { method: 'POST', body: {} }),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: ['studies', studyId] }),
        client.invalidateQueries({ queryKey: ['cases'] }),
      ]);
    },
  });
}
