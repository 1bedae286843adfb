import { accessToken, renewAccessToken } from '@/hooks/api/accessToken';
import { urlOf } from '@/hooks/api/urlOf';
import { measurementEndpoints } from '@/shared/contracts/measurements';

async function request(token: string, signal: AbortSignal): Promise<Response> {
  return fetch(urlOf(measurementEndpoints.events), {
    headers: { Accept: 'text/event-stream', Authorization: `Bearer ${token}` },
    cache: 'no-store',
    signal,
  });
}

/**
 * Opens the laboratory's event stream and gives its text as it comes. `EventSource` cannot carry the token, so this is
 * `fetch`.
 * @throws when the stream is turned away or the platform cannot read an answer piece by piece.
 */
export async function* openStream(signal: AbortSignal): AsyncGenerator<string> {
  let response = await request(await accessToken(), signal);
  if (response.status === 401) {
    const session = await renewAccessToken();
    if (session !== null) response = await request(session.accessToken, signal);
  }
  if (!response.ok || !response.body) throw new Error(`no event stream: status ${response.status}`);
  const reader = response.body.getReader();
  const decoder = new TextDecoder();
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) return;
      yield decoder.decode(value, { stream: true });
    }
  } finally {
    void reader.cancel().catch(() => undefined);
  }
}
