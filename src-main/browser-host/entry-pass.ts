import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

/**
 * Who may come in: whoever brings the code of the first address, once, gets a cookie; from then on the cookie is the
 * pass. Both are drawn anew at each start and never written to disk.
 */
export class EntryPass {
  readonly #secret = randomBytes(32).toString('base64url');
  #code: string | null = randomBytes(24).toString('base64url');

  /** The code for the first address; null once it was used. */
  get code(): string | null {
    return this.#code;
  }

  /** True for the right code the first time it is brought; the code is void from then on. */
  redeem(code: string): boolean {
    if (this.#code === null || !sameText(code, this.#code)) return false;
    this.#code = null;
    return true;
  }

  /** The cookie's line. Cookies do not know ports, so the port is part of the name. */
  cookie(port: number): string {
    return `${cookieName(port)}=${this.#secret}; Path=/; HttpOnly; SameSite=Strict`;
  }

  /** Whether the cookies that a browser sent hold the pass. */
  admits(cookies: string | undefined, port: number): boolean {
    const start = `${cookieName(port)}=`;
    return (cookies ?? '')
      .split(';')
      .map((cookie) => cookie.trim())
      .some((cookie) => cookie.startsWith(start) && sameText(cookie.slice(start.length), this.#secret));
  }
}

function cookieName(port: number): string {
  return `normloom-${port}`;
}

/** Compares in a time that does not tell how much of the text is right. */
function sameText(left: string, right: string): boolean {
  return timingSafeEqual(createHash('sha256').update(left).digest(), createHash('sha256').update(right).digest());
}
