import { config } from '../env.ts';

/** Headers that every answer carries. The content policy itself comes from Astro, with the hashes of its scripts. */
export function securityHeaders(): Record<string, string> {
  return {
    'X-Content-Type-Options': 'nosniff',
    'X-Frame-Options': 'DENY',
    // Not `no-referrer`: browsers then send `Origin: null` with our own forms, which the origin check refuses.
    'Referrer-Policy': 'same-origin',
    'Permissions-Policy': 'camera=(), microphone=(), geolocation=(), payment=()',
    'Cross-Origin-Opener-Policy': 'same-origin',
    'Cross-Origin-Resource-Policy': 'same-origin',
    ...(config().appUrl.startsWith('https://')
      ? { 'Strict-Transport-Security': 'max-age=63072000; includeSubDomains' }
      : {}),
  };
}
