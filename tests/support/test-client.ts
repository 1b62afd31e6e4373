/** A browser's part in a test: keeps cookies, sends the token that shows a request comes from a page of ours. */

export interface Answer<T = unknown> {
  status: number;
  headers: Headers;
  body: T;
  text: string;
}

export class TestClient {
  private readonly cookies = new Map<string, string>();

  constructor(private readonly base: string) {}

  get = <T = unknown>(path: string, headers: Record<string, string> = {}) =>
    this.send<T>('GET', path, undefined, headers);
  post = <T = unknown>(path: string, body: unknown = {}, headers: Record<string, string> = {}) =>
    this.send<T>('POST', path, body, headers);
  put = <T = unknown>(path: string, body: unknown, headers: Record<string, string> = {}) =>
    this.send<T>('PUT', path, body, headers);
  delete = <T = unknown>(path: string, headers: Record<string, string> = {}) =>
    this.send<T>('DELETE', path, undefined, headers);

  /** A change that names the version it is made to. */
  putVersion = <T = unknown>(path: string, body: unknown, version: number) =>
    this.put<T>(path, body, { 'if-match': `"${version}"` });

  cookie(name: string): string | undefined {
    return this.cookies.get(name);
  }

  async send<T>(method: string, path: string, body: unknown, headers: Record<string, string>): Promise<Answer<T>> {
    const response = await fetch(this.base + path, {
      method,
      redirect: 'manual',
      headers: {
        cookie: [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; '),
        'x-xsrf-token': decodeURIComponent(this.cookies.get('XSRF-TOKEN') ?? ''),
        ...(body === undefined ? {} : { 'content-type': 'application/json' }),
        ...headers,
      },
      ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
    });
    this.keep(response.headers.getSetCookie());
    const text = await response.text();
    const json = response.headers.get('content-type')?.includes('json') ?? false;
    return {
      status: response.status,
      headers: response.headers,
      body: (json && text ? JSON.parse(text) : text) as T,
      text,
    };
  }

  private keep(lines: string[]): void {
    for (const line of lines) {
      const [pair = ''] = line.split(';');
      const at = pair.indexOf('=');
      const name = pair.slice(0, at);
      if (/expires=thu, 01 jan 1970/i.test(line)) this.cookies.delete(name);
      else this.cookies.set(name, pair.slice(at + 1));
    }
  }
}
