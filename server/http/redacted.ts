/** What must not stand in a log: it would let a reader sign in as somebody else. */
export const REDACTED = [
  'req.headers.cookie',
  'req.headers.authorization',
  'res.headers["set-cookie"]',
];
