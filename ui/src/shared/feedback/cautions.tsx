import { Warning16Filled } from '@fluentui/react-icons';
import { Link } from 'react-router-dom';
import './feedback.css';

export type CautionLine = { code: string; message: string; strong?: boolean; whyLink?: string };

/** Cautions stand directly under the number that they concern, in words, each with a link to its reason. */
export function Cautions({ of, label = 'Cautions' }: { of: readonly CautionLine[]; label?: string }) {
  if (of.length === 0) return null;
  return (
    <ul className="cautions" aria-label={label}>
      {of.map((caution) => (
        <li key={caution.code + caution.message} className={caution.strong ? 'caution strong' : 'caution'}>
          <Warning16Filled aria-hidden />
          <span>
            {caution.message}
            {caution.whyLink && (
              <>
                {' '}
                <Link to={caution.whyLink} aria-label={`Why: ${caution.message}`}>
                  Why
                </Link>
              </>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
