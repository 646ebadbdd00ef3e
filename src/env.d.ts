/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    requestId: string;
    /** Set by the front server, which alone decides whom to believe about it. */
    clientAddress: string;
  }
}
