/** An answer of the server as it came, before it is judged. */
export interface Answer {
  status: number;
  body: unknown;
  requestId?: string;
}

/** Headers of every call: the server refuses changes that come without them from elsewhere. */
export const callHeaders = { Accept: 'application/json', 'X-Requested-With': 'combwright' };

/** The JSON of a text, or undefined where it is none. */
export function readJson(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return undefined;
  }
}
