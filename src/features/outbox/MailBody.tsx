import { Link } from 'react-router-dom';

const ADDRESS = /(https?:\/\/\S+)/;

/** Path of an address that leads into this app, whatever host the mail names; undefined for any other. */
function ownPath(address: string): string | undefined {
  if (!URL.canParse(address)) return undefined;
  const { pathname, search } = new URL(address);
  return /^\/(?:invitation\/|reset$|sign-in$)/.test(pathname) ? pathname + search : undefined;
}

/** A mail as text; links into the app can be followed. */
export function MailBody({ body }: { body: string }) {
  return (
    <p className="max-w-prose whitespace-pre-wrap break-words">
      {body.split(ADDRESS).map((part, index) => {
        const to = ADDRESS.test(part) ? ownPath(part) : undefined;
        return to ? <Link key={index} to={to} className="underline underline-offset-3">{part}</Link> : part;
      })}
    </p>
  );
}
