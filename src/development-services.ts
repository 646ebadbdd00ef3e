import { openProcessServices } from './process-services.ts';
import { readServiceSettings } from './server/env.ts';
import { type Services } from './server/services.ts';

let opened: Promise<Services> | undefined;

/** The services of the development server, which reloads modules but keeps its process. */
export function developmentServices(): Promise<Services> {
  opened ??= openProcessServices(readServiceSettings(), 'web');
  return opened;
}
