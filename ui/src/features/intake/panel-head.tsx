import { Button } from '@fluentui/react-components';
import { Dismiss20Regular } from '@fluentui/react-icons';
import { useEffect, useRef, type ReactNode } from 'react';
import { useNarrow } from '../../shared/theme/colour-mode';

type Props = { title: string; sub?: ReactNode; onClose: () => void };

/** Head of a panel beside the grid; it takes the keyboard when the panel opens. */
export function PanelHead({ title, sub, onClose }: Props) {
  const heading = useRef<HTMLHeadingElement>(null);
  const narrow = useNarrow();
  useEffect(() => {
    heading.current?.focus({ preventScroll: true });
    if (narrow) heading.current?.scrollIntoView?.({ block: 'start' }); // there it stands beneath the grid
  }, [narrow]);
  return (
    <header className="panel-head">
      <h2 ref={heading} tabIndex={-1}>
        {title}
      </h2>
      {sub && <span className="sl-small sl-muted">{sub}</span>}
      <span className="sl-grow" />
      <Button
        size="small"
        appearance="subtle"
        icon={<Dismiss20Regular />}
        aria-label={`Close ${title}`}
        onClick={onClose}
      />
    </header>
  );
}
