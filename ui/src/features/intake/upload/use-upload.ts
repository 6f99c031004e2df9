import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useMutation } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import { toApiProblem } from '../../../shared/api/api-problem';
import { uploadFile } from '../queries';

type Wanted = { file: File; kind: string; title: string };

/** One upload with its progress from 0 to 1; it can be stopped, and a stopped one is no fault. */
export function useUpload(onDone: (detail: SubmissionDetail) => Promise<void>) {
  const [progress01, setProgress] = useState(0);
  const stop = useRef<AbortController | null>(null);
  const { mutate, isPending, error, reset } = useMutation({
    mutationFn: (wanted: Wanted) => {
      stop.current = new AbortController();
      setProgress(0);
      return uploadFile(wanted, setProgress, stop.current.signal);
    },
    onSuccess: onDone,
  });
  return {
    send: mutate,
    cancel: () => stop.current?.abort(),
    forget: reset,
    progress01,
    busy: isPending,
    problem: error ? toApiProblem(error) : null,
  };
}
