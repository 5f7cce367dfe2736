/** Over https the name itself says: this host alone, every path, never without encryption (RFC 6265bis, `__Host-`). */
export const SESSION_COOKIE_SECURE = "__Host-stillwell-session";
/** On this machine alone, without https. */
export const SESSION_COOKIE = "stillwell-session";
