import { paths } from './paths.ts';

/** Where sign-in leads on to. Only addresses of our own pages do; a browser reads `/\host` as another site. */
export function safeWay(back: string | null): string {
  return back !== null && /^\/(?![/\\])/.test(back) ? back : paths.today;
}
