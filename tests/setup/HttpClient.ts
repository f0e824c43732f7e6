/** A browser as far as a server can tell: keeps cookies, sends JSON. */

export interface Answer {
  status: number;
  body: Record<string, unknown>;
  headers: Headers;
  text: string;
  bytes: Uint8Array;
}

export interface Ask {
  /** sent as it is, in place of JSON */
  raw?: string | FormData;
  headers?: Record<string, string>;
}

export class HttpClient {
  readonly url: string;
  readonly cookies = new Map<string, string>();

  constructor(url: string) {
    this.url = url;
  }

  get(path: string, ask: Ask = {}): Promise<Answer> {
    return this.send('GET', path, undefined, ask);
  }

  post(path: string, body?: unknown, ask: Ask = {}): Promise<Answer> {
    return this.send('POST', path, body, ask);
  }

  /** Sends `bytes` as the one file of a form, under a name of the caller's. */
  upload(path: string, bytes: Uint8Array, name = 'photo.jpg', field = 'file'): Promise<Answer> {
    const form = new FormData();
    form.append(field, new Blob([Uint8Array.from(bytes)]), name);
    return this.send('POST', path, undefined, { raw: form, headers: {} });
  }

  delete(path: string, ask: Ask = {}): Promise<Answer> {
    return this.send('DELETE', path, undefined, ask);
  }

  async send(method: string, path: string, body: unknown, { raw, headers = {} }: Ask = {}): Promise<Answer> {
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const sent = raw ?? (body === undefined ? undefined : JSON.stringify(body));
    const response = await fetch(`${this.url}${path}`, {
      method,
      redirect: 'manual',
      headers: { ...(typeof sent !== 'string' ? {} : { 'content-type': 'application/json' }), ...(cookie === '' ? {} : { cookie }), ...headers },
      ...(sent === undefined ? {} : { body: sent }),
    });
    for (const line of response.headers.getSetCookie()) {
      const [pair = '', ...attributes] = line.split(';').map((part) => part.trim());
      const name = pair.slice(0, pair.indexOf('='));
      const gone = attributes.some((attribute) => /^expires=thu, 01 jan 1970/i.test(attribute));
      if (gone) this.cookies.delete(name);
      else this.cookies.set(name, pair.slice(pair.indexOf('=') + 1));
    }
    const bytes = new Uint8Array(await response.arrayBuffer());
    const text = new TextDecoder().decode(bytes);
    let parsed: unknown = {};
    if (/json/.test(response.headers.get('content-type') ?? '')) parsed = JSON.parse(text);
    return { status: response.status, body: parsed as Record<string, unknown>, headers: response.headers, text, bytes };
  }
}
