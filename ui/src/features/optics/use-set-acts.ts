import { useMutation } from '@tanstack/react-query';
import type { OpticalSetDetail } from '@siltlight/common/wire/optics';
import { useNavigate } from 'react-router-dom';
import { toApiProblem } from '../../shared/api/api-problem';
import { useSay } from '../../shared/feedback/toasts';
import { addVersion, createSet, publishDraft, rememberSet, saveDraft } from './queries';
import type { ReadSet, SetForm } from './set-form';

type Given = {
  set: OpticalSetDetail | null;
  form: SetForm;
  read: ReadSet;
  dirty: boolean;
  onSaved: (set: OpticalSetDetail, form: SetForm) => void;
};

/** Saves the form as the draft it belongs to, begins a version or a set with it, and publishes. */
export function useSetActs({ set, form, read, dirty, onSaved }: Given) {
  const say = useSay();
  const navigate = useNavigate();
  const keep = async (): Promise<OpticalSetDetail> => {
    if (!read.draft) throw new Error('Mend the marked fields first.');
    if (set?.rights.mayEdit) return dirty ? saveDraft(set, read.draft) : set;
    if (set?.rights.mayAddVersion) return addVersion(set.slug, read.draft);
    return createSet({ ...read.draft, title: form.title.trim() });
  };
  const done = async (saved: OpticalSetDetail, words: string) => {
    onSaved(saved, form);
    await rememberSet(saved);
    say(words, `${saved.title}, version ${saved.number}`);
    if (saved.slug !== set?.slug) void navigate(`/optics/${saved.slug}`);
  };
  const save = useMutation({
    mutationFn: keep,
    onSuccess: (saved) => done(saved, 'Draft saved'),
  });
  const publish = useMutation({
    mutationFn: async () => publishDraft((await keep()).versionId),
    onSuccess: (saved) => done(saved, 'Published'),
  });
  const error = save.error ?? publish.error;
  return {
    save: save.mutate,
    publish: publish.mutate,
    busy: save.isPending || publish.isPending,
    problem: error ? toApiProblem(error) : null,
  };
}
