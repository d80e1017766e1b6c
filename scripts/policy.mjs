/**
 * What the page may do, written once: the server sends it as headers, the build writes it into the page as a meta tag.
 * Everything comes from the page's own origin; no script is inlined or evaluated, and nothing is framed or sent anywhere.
 */
const directives = {
  "default-src": "'none'",
  "script-src": "'self'",
  "style-src": "'self'",
  // Computed places (a call-out beside its station, the length of a bar) are written as style attributes. An attribute
  // styles its own element and can load nothing that img-src and font-src do not allow; style elements stay refused.
  "style-src-attr": "'unsafe-inline'",
  "img-src": "'self' data: blob:",
  "font-src": "'self'",
  "connect-src": "'self'",
  "worker-src": "'self'",
  "manifest-src": "'self'",
  "base-uri": "'none'",
  "form-action": "'none'",
};

const written = Object.entries(directives).map(([name, sources]) => `${name} ${sources}`);

/** For `<meta http-equiv="Content-Security-Policy">`, where browsers ignore `frame-ancestors` and say so. */
export const metaPolicy = written.join("; ");

export const securityHeaders = {
  "Content-Security-Policy": [...written, "frame-ancestors 'none'"].join("; "),
  "Cross-Origin-Opener-Policy": "same-origin",
  "Referrer-Policy": "no-referrer",
  "X-Content-Type-Options": "nosniff",
};
