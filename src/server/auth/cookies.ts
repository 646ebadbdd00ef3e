import { type ServiceSettings } from '../env.ts';

type CookieSettings = Pick<ServiceSettings, 'PUBLIC_URL' | 'INSTALLATION_ID'>;

/** Two copies on one host share a cookie jar: each names its cookies after its own installation. */
export function cookiePrefix(settings: CookieSettings): string {
  const host = settings.PUBLIC_URL.startsWith('https:') ? '__Host-' : '';
  return `${host}${settings.INSTALLATION_ID}`;
}

/** The name of the cookie that says, readable by scripts, only that someone is signed in. */
export function hintCookieName(settings: CookieSettings): string {
  return `${cookiePrefix(settings)}.signed_in`;
}

/** The hint beside a session cookie: set when one begins, ended when it ends. */
export function hintCookie(settings: CookieSettings, signedIn: boolean): string {
  const secure = settings.PUBLIC_URL.startsWith('https:') ? '; Secure' : '';
  const life = signedIn ? `1; Max-Age=${String(30 * 24 * 3600)}` : '; Max-Age=0';
  return `${hintCookieName(settings)}=${life}; Path=/; SameSite=Lax${secure}`;
}
