import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import { toApiProblem, type ApiProblem } from '../../shared/api/api-problem';
import type { Change } from './changes';
import { listKey, submissionKey, submissionQuery } from './queries';

export type Changing = {
  /** Sends a change; answers whether it was taken. What was refused stands in `problem`. */
  change: (what: Change) => Promise<boolean>;
  busy: boolean;
  problem: ApiProblem | null;
  /** Somebody else was faster: nothing was changed, and the page shows an older state. */
  conflict: boolean;
  dismiss: () => void;
  reload: () => Promise<void>;
};

const isConflict = (problem: ApiProblem | null) => problem?.status === 412 || problem?.status === 409;

/** All changes of one submission, one after the other, each with the revision that the page shows when it is sent. */
export function useChanging(id: string): Changing {
  const client = useQueryClient();
  const [problem, setProblem] = useState<ApiProblem | null>(null);
  const { mutateAsync, isPending } = useMutation({
    scope: { id: `submission-${id}` },
    mutationFn: (what: Change) => {
      const seen = client.getQueryData(submissionQuery(id).queryKey);
      return what(`/submissions/${id}`, { headers: { 'If-Match': `"${seen?.revision ?? 0}"` } });
    },
    onSuccess: async (detail: SubmissionDetail) => {
      client.setQueryData(submissionQuery(id).queryKey, detail);
      const parts = ['grid', 'findings', 'history'];
      const others = [listKey, ['desk'], ...(detail.dataset ? [['datasets']] : [])];
      await Promise.all([
        ...parts.map((part) => client.invalidateQueries({ queryKey: [...submissionKey(id), part] })),
        ...others.map((queryKey) => client.invalidateQueries({ queryKey })),
      ]);
    },
  });
  const change = useCallback(
    async (what: Change) => {
      try {
        await mutateAsync(what);
        setProblem(null);
        return true;
      } catch (error) {
        setProblem(toApiProblem(error));
        return false;
      }
    },
    [mutateAsync],
  );
  const dismiss = useCallback(() => setProblem(null), []);
  const reload = useCallback(async () => {
    await client.invalidateQueries({ queryKey: submissionKey(id) });
    setProblem(null);
  }, [client, id]);
  return { change, busy: isPending, problem, conflict: isConflict(problem), dismiss, reload };
}
