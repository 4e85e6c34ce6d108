/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** The signed-in person, or null. */
    actor: import('@/lib/server/people').SignedInPerson | null;
    /** The session behind the cookie, or null. */
    session: { id: string; fresh: boolean } | null;
    theme: 'light' | 'dark' | null;
  }
}
