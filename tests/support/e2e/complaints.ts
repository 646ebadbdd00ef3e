import { type BrowserContext, type ConsoleMessage } from '@playwright/test';

const OWN_STATUS = /^Failed to load resource: the server responded with a status of (4\d\d|500)/;

/**
 * Collects what the browser complains about: errors and warnings in the console, the policy's violations among
 * them, and errors that nothing caught. A page that is itself answered with 4xx is the spec's own business.
 */
export function listenForComplaints(context: BrowserContext, complaints: string[]): void {
  const documents = new Set<string>();
  context.on('request', (request) => {
    if (request.isNavigationRequest()) documents.add(request.url());
  });
  context.on('console', (message) => {
    if (!['error', 'warning'].includes(message.type()) || isOwnStatus(message, documents)) return;
    complaints.push(`${message.type()}: ${message.text()} (${message.location().url})`);
  });
  context.on('weberror', (error) => {
    complaints.push(`uncaught: ${error.error().message}`);
  });
}

function isOwnStatus(message: ConsoleMessage, documents: ReadonlySet<string>): boolean {
  const { url } = message.location();
  const [, status] = OWN_STATUS.exec(message.text()) ?? [];
  if (status === undefined || !documents.has(url)) return false;
  // A fault is never expected but from the page that is shown for faults.
  return status !== '500' || new URL(url).pathname === '/500';
}
