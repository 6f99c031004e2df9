import { useEffect, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { useSession } from '../api/session';
import './page.css';

export type Crumb = { label: string; to?: string };

type Props = {
  title: string;
  /** Where the title needs markup (a unit, a name in italics); the document title stays plain. */
  heading?: ReactNode;
  crumbs?: Crumb[];
  state?: ReactNode;
  sub?: ReactNode;
  /** One primary action at the right, with at most two plain ones before it. */
  actions?: ReactNode;
  children: ReactNode;
};

/** Head and content of a page. The frame moves the focus to its title after each navigation. */
export function Page({ title, heading, crumbs = [], state, sub, actions, children }: Props) {
  const { demo } = useSession();
  useEffect(() => {
    document.title = `${title} · Siltlight`;
  }, [title]);
  return (
    <>
      <header className="page-head">
        {crumbs.length > 0 && (
          <nav className="page-crumbs" aria-label="Breadcrumb">
            <ol>
              {crumbs.map((crumb) => (
                <li key={crumb.label}>{crumb.to ? <Link to={crumb.to}>{crumb.label}</Link> : crumb.label}</li>
              ))}
            </ol>
          </nav>
        )}
        <div className="page-title">
          <h1 tabIndex={-1}>{heading ?? title}</h1>
          {state}
          {(sub || demo) && (
            <span className="page-sub">
              {sub}
              {sub && demo && ' · '}
              {demo && 'invented data'}
            </span>
          )}
          <span className="sl-grow" />
          <div className="page-actions sl-noprint">{actions}</div>
        </div>
      </header>
      {children}
    </>
  );
}
