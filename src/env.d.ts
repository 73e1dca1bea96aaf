/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Whoever asks, for `may` and for every use case; on the few pages open to all it may be nobody. */
    actor: import('./domain/people/may').Actor;
    /** Who they are, for showing; null where nobody is signed in. */
    person: import('./domain/api/schemas/me').Me | null;
    /** Why a page could not be shown; read by the pages 403, 404 and 500. */
    refusal?: import('./server/refusal').Refusal;
    /** Where trying again may help, for the same pages. */
    again?: string;
  }
}
