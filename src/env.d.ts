/// <reference path="../.astro/types.d.ts" />

declare namespace App {
  interface Locals {
    /** Names one request in answers and logs. */
    requestId: string;
    /** Who is asking; null when nobody is signed in. */
    viewer: import('./auth/viewer').Viewer | null;
    /** Set when a page could not be shown; the page `refused` says why. */
    problem?: import('./errors').Problem;
  }
}
