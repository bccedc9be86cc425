/** A browser without scripts: keeps cookies, sends our origin with forms, follows nothing by itself. */
export class Visitor {
  private readonly cookies = new Map<string, string>();

  /**
   * @param network the address it comes from, told by the proxy of an app that trusts one
   * @param publicUrl the address in its address bar, where a proxy stands in front of the app
   */
  constructor(
    private readonly url: string,
    private readonly network?: string,
    private readonly publicUrl = url,
  ) {}

  get sessionId(): string | undefined {
    return this.cookies.get('session');
  }

  setCookie(name: string, value: string): void {
    this.cookies.set(name, value);
  }

  get(path: string, headers: Record<string, string> = {}): Promise<Response> {
    return this.send(path, { headers });
  }

  postForm(path: string, fields: Record<string, string>): Promise<Response> {
    return this.send(path, {
      method: 'POST',
      headers: { 'Content-Type': 'application/x-www-form-urlencoded' },
      body: new URLSearchParams(fields).toString(),
    });
  }

  /** A call of the API, with a JSON body if there is one. */
  call(method: string, path: string, body?: unknown): Promise<Response> {
    return this.send(path, {
      method,
      ...(body === undefined
        ? {}
        : { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) }),
    });
  }

  signIn(email: string, password: string, next = '/'): Promise<Response> {
    return this.postForm('/sign-in', { email, password, next });
  }

  private async send(path: string, init: RequestInit): Promise<Response> {
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const answer = await fetch(new URL(path, this.url), {
      ...init,
      redirect: 'manual',
      headers: {
        Origin: new URL(this.publicUrl).origin,
        'User-Agent': 'Mozilla/5.0 (X11; Linux x86_64; rv:133.0) Gecko/20100101 Firefox/133.0',
        ...(cookie ? { Cookie: cookie } : {}),
        ...(this.network ? { 'X-Forwarded-For': this.network } : {}),
        ...init.headers,
      },
    });
    for (const line of answer.headers.getSetCookie()) {
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? [];
      if (value === '' || /Max-Age=0|Expires=Thu, 01 Jan 1970/i.test(line)) this.cookies.delete(name);
      else this.cookies.set(name, value);
    }
    return answer;
  }
}
