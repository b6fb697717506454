import { useState } from 'react';
import { renewSession } from './call.ts';

/**
 * A picture that travels with the session. Pictures are fetched by the browser and not by `call`, so one that
 * fails because the session had to be renewed is asked for once more.
 */
export function usePicture(url: string): { src: string; failed: boolean; onError: () => void } {
  const [tries, setTries] = useState({ url, count: 0 });
  const count = tries.url === url ? tries.count : 0;
  const onError = () => {
    if (count > 0) {
      setTries({ url, count: 2 });
      return;
    }
    renewSession()
      .then((renewed) => setTries({ url, count: renewed ? 1 : 2 }))
      .catch(() => setTries({ url, count: 2 }));
  };
  const again = url.includes('?') ? `${url}&again=1` : `${url}?again=1`;
  return { src: count === 1 ? again : url, failed: count === 2, onError };
}
