/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    requestId: string;
    viewer: import('./server/auth/viewer.ts').Viewer | null;
    language: import('./i18n/languages.ts').Language;
    t: import('./i18n/translator.ts').Translate;
    formats: import('./i18n/format.ts').Formats;
    theme: 'auto' | 'light' | 'dark';
    /** Set while `refused.astro` shows why a page was not given. */
    refusal: import('./server/errors.ts').AppError | null;
  }
}
