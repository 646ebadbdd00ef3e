import { type FormState, type RequestParts } from './server/http/request-parts.ts';
import { type Services } from './server/services.ts';

declare global {
  namespace App {
    interface Locals {
      /** Set by the front server: what this process works with, who asks from where. */
      services: Services;
      requestId: string;
      clientAddress: string;
      /** Set by the middleware. */
      parts: RequestParts;
      /** A form that came back with something to say about it. */
      form: FormState;
      detourFor: (code: string, next: string) => string;
      showDrawingSet?: boolean;
    }
  }
}
