import type { NestFastifyApplication } from '@nestjs/platform-fastify';

/** Somebody of the sample shop, doing things through the same API as everybody. */
export class SamplePerson {
  private constructor(
    private readonly app: NestFastifyApplication,
    private readonly origin: string,
    private readonly cookie: string,
  ) {}

  static async signIn(app: NestFastifyApplication, origin: string, email: string, password: string): Promise<SamplePerson> {
    const answer = await app.inject({ method: 'POST', url: '/api/session', headers: { origin }, payload: { email, password } });
    if (answer.statusCode !== 200) throw new Error(`${email} could not sign in: ${answer.payload}`);
    return new SamplePerson(app, origin, String(answer.headers['set-cookie']).split(';')[0]!);
  }

  async get<T>(path: string): Promise<T> {
    return this.ask<T>('GET', path);
  }

  async post<T>(path: string, payload: object = {}): Promise<T> {
    return this.ask<T>('POST', path, payload);
  }

  async put<T>(path: string, payload: object): Promise<T> {
    return this.ask<T>('PUT', path, payload);
  }

  /** One file as a form, as a browser sends it. */
  async upload<T>(path: string, name: string, text: string): Promise<T> {
    const edge = 'sample-shop-file';
    const payload = `--${edge}\r\ncontent-disposition: form-data; name="file"; filename="${name}"\r\ncontent-type: text/csv\r\n\r\n${text}\r\n--${edge}--\r\n`;
    const answer = await this.app.inject({ method: 'POST', url: `/api${path}`, headers: { origin: this.origin, cookie: this.cookie, 'content-type': `multipart/form-data; boundary=${edge}` }, payload });
    if (answer.statusCode >= 300) throw new Error(`the file for ${path} was refused (${answer.statusCode}): ${answer.payload}`);
    return JSON.parse(answer.payload) as T;
  }

  private async ask<T>(method: 'GET' | 'POST' | 'PUT', path: string, payload?: object): Promise<T> {
    const answer = await this.app.inject({ method, url: `/api${path}`, headers: { origin: this.origin, cookie: this.cookie }, ...(payload ? { payload } : {}) });
    if (answer.statusCode >= 300) throw new Error(`${method} ${path} was refused (${answer.statusCode}): ${answer.payload}\n${JSON.stringify(payload)}`);
    return (answer.payload === '' ? undefined : JSON.parse(answer.payload)) as T;
  }
}
