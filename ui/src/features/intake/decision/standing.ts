import { METADATA_FORM } from '@siltlight/common/dataset/metadata-form';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { counted } from '../../../shared/number/format';

type Detail = Pick<SubmissionDetail, 'counts' | 'rights' | 'state' | 'missingMetadata'>;

export const labelsOf = (keys: readonly string[]) =>
  keys.map((key) => METADATA_FORM.find(({ field }) => field === key)?.label.toLowerCase() ?? 'an answer');

/** "2 errors stand, 6 warnings are open." */
export function standing({ counts: { errors, openWarnings } }: Pick<Detail, 'counts'>): string {
  if (errors === 0 && openWarnings === 0) return 'No error stands and no warning is open.';
  const parts = [
    errors > 0 && `${counted(errors, 'error')} ${errors === 1 ? 'stands' : 'stand'}`,
    openWarnings > 0 && `${counted(openWarnings, 'warning')} ${openWarnings === 1 ? 'is' : 'are'} open`,
  ];
  return `${parts.filter(Boolean).join(', ')}.`;
}

/** Why a submission cannot be handed in yet, in the words of the form; null when it can. */
export function whyNotSubmit({ counts, rights, missingMetadata }: Detail): string | null {
  if (rights.maySubmit) return null;
  const wanted = [
    counts.errors > 0 && 'mend the errors, answer them in the form, or leave their rows out',
    missingMetadata.length > 0 && `answer ${labelsOf(missingMetadata).join(', ')}`,
    counts.usableRows === 0 && 'map a site, a position, an age and a value, as no row is usable yet',
  ].filter(Boolean);
  return wanted.length > 0 ? `Before submitting: ${wanted.join('; ')}.` : (rights.whyNot ?? null);
}

/** Why a steward cannot approve yet; null when nothing stands in the way. */
export function whyNotApprove({ counts, rights }: Detail): string | null {
  if (!rights.mayDecide) return rights.whyNot;
  if (counts.errors > 0) return 'An error cannot be waived: return it to its contributor.';
  return counts.openWarnings > 0 ? 'Approval opens when each warning is mended or waived.' : null;
}
