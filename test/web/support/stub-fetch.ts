import { vi } from 'vitest';

export interface SentRequest {
  method: string;
  url: string;
  body: unknown;
  headers: Headers;
}

/** Answers every request of a test with one response, and keeps what was sent. */
export function stubFetch(status: number, answer: unknown): SentRequest[] {
  const sent: SentRequest[] = [];
  vi.stubGlobal('fetch', (url: string, init: RequestInit = {}) => {
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : init.body;
    sent.push({ method: init.method ?? 'GET', url, body, headers: new Headers(init.headers) });
    const text = typeof answer === 'string' ? answer : JSON.stringify(answer);
    return Promise.resolve(new Response(status === 204 ? null : text, { status }));
  });
  return sent;
}
