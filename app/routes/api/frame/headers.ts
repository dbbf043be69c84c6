/**
 * What every answer of the API carries: it is data and never a page, and nobody between keeps a copy
 * (OWASP REST Security Cheat Sheet, "Security headers").
 */
export const answerHeaders = {
  "Cache-Control": "no-store",
  "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'",
  "Referrer-Policy": "no-referrer",
  "X-Content-Type-Options": "nosniff",
} as const;
