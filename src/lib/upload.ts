import { type Answer, callHeaders, readJson } from './answer.ts';
import { unreachable } from './call-error.ts';

interface UploadInput {
  file?: File;
  body?: unknown;
  signal?: AbortSignal;
  onProgress?: (share: number) => void;
}

/** Sends one file as multipart field `file`. XMLHttpRequest, since fetch does not tell how much has been sent. */
export function upload(method: string, address: string, { file, body, signal, onProgress }: UploadInput): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const form = new FormData();
    for (const [name, value] of Object.entries((body ?? {}) as Record<string, unknown>)) form.append(name, String(value));
    if (file) form.append('file', file);
    const request = new XMLHttpRequest();
    const abort = () => request.abort();
    const settle = () => signal?.removeEventListener('abort', abort);
    request.open(method.toUpperCase(), address);
    for (const [name, value] of Object.entries(callHeaders)) request.setRequestHeader(name, value);
    request.upload.onprogress = (event) => {
      if (event.lengthComputable) onProgress?.(event.loaded / event.total);
    };
    request.onload = () => {
      settle();
      resolve({ status: request.status, body: readJson(request.responseText), requestId: request.getResponseHeader('x-request-id') ?? undefined });
    };
    request.onerror = () => {
      settle();
      reject(unreachable());
    };
    request.onabort = () => {
      settle();
      reject(signal?.reason instanceof Error ? signal.reason : new DOMException('The upload was cancelled.', 'AbortError'));
    };
    if (signal?.aborted) {
      request.onabort(new ProgressEvent('abort'));
      return;
    }
    signal?.addEventListener('abort', abort);
    request.send(form);
  });
}
