import {
  ArrowReply16Regular,
  CheckmarkCircle16Filled,
  Circle16Regular,
  Clock16Regular,
  DismissCircle16Regular,
  DocumentArrowUp16Regular,
  Eye16Regular,
  Globe16Regular,
  History16Regular,
  Prohibited16Regular,
  Warning16Filled,
  type FluentIcon,
} from '@fluentui/react-icons';

type Tint = 'plain' | 'ice' | 'slate' | 'loess' | 'moss' | 'rust';

// Icon, word and bar: the colour is never the only sign.
const states: Record<string, [word: string, icon: FluentIcon, tint: Tint]> = {
  draft: ['Draft', Circle16Regular, 'plain'],
  queued: ['Queued', Clock16Regular, 'plain'],
  running: ['Running', Clock16Regular, 'plain'],
  done: ['Done', CheckmarkCircle16Filled, 'moss'],
  failed: ['Failed', Prohibited16Regular, 'rust'],
  cancelled: ['Cancelled', DismissCircle16Regular, 'plain'],
  submitted: ['Submitted', DocumentArrowUp16Regular, 'ice'],
  'in-review': ['In review', Eye16Regular, 'loess'],
  'awaiting-sign-off': ['Awaits sign-off', Eye16Regular, 'loess'],
  returned: ['Returned', ArrowReply16Regular, 'loess'],
  approved: ['Approved', CheckmarkCircle16Filled, 'moss'],
  declined: ['Declined', Prohibited16Regular, 'rust'],
  published: ['Published', Globe16Regular, 'slate'],
  superseded: ['Superseded', History16Regular, 'loess'],
  stale: ['Inputs superseded', Warning16Filled, 'loess'],
  withdrawn: ['Withdrawn', Prohibited16Regular, 'rust'],
  invited: ['Invited', Clock16Regular, 'plain'],
  active: ['Active', CheckmarkCircle16Filled, 'moss'],
  disabled: ['Disabled', Prohibited16Regular, 'rust'],
};

/** State of an object: icon, word and bar. A state not known here is shown by its own word. */
export function StateTag({ state, word }: { state: string; word?: string }) {
  const [known, Icon, tint] = states[state] ?? [state, Circle16Regular, 'plain'];
  return (
    <span className={`state-tag ${tint}`}>
      <Icon aria-hidden />
      {word ?? known}
    </span>
  );
}
