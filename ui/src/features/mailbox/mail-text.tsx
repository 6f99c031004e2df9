import { Link } from 'react-router-dom';

const address = /(https?:\/\/[^\s<>]+)/g;

/** Text of a mail; links into this service stay inside the client, others are left as text. */
export function MailText({ text }: { text: string }) {
  return (
    <div className="mail-text">
      {text.split(address).map((part, at) => (at % 2 === 1 ? <MailLink key={at} to={part} /> : part))}
    </div>
  );
}

function MailLink({ to }: { to: string }) {
  const target = new URL(to);
  if (target.origin !== window.location.origin) return <>{to}</>;
  return <Link to={target.pathname + target.search + target.hash}>{to}</Link>;
}
