import { useCallback, useEffect, useRef, useState } from 'react';
import { ranked } from '../../../../../shared/findings/arrange/arrange.ts';
import type { ArrangeAsk } from '../../../../../shared/findings/arrange/ask.ts';
import type { Candidate } from '../../../../../shared/findings/arrange/judge.ts';
import type { ArrangeNews } from './arrange.worker.ts';

export interface Arranging {
  state: 'idle' | 'trying' | 'done' | 'stopped' | 'failed';
  /** What was asked; the candidates answer this, whatever has been typed since. */
  ask: ArrangeAsk | null;
  tried: number;
  ways: number;
  /** Time ran out before all ways were tried. */
  late: boolean;
  /** The best first. */
  candidates: readonly Candidate[];
}

const idle: Arranging = { state: 'idle', ask: null, tried: 0, ways: 0, late: false, candidates: [] };

/** Arranges in a worker, so that the page stays free; a new ask ends the one before it, and so does leaving. */
export function useArranging(): { arranging: Arranging; start: (ask: ArrangeAsk) => void; stop: () => void } {
  const [arranging, setArranging] = useState(idle);
  const worker = useRef<Worker | null>(null);
  const end = useCallback(() => {
    worker.current?.terminate();
    worker.current = null;
  }, []);
  useEffect(() => end, [end]);

  const start = useCallback((ask: ArrangeAsk) => {
    end();
    setArranging({ ...idle, state: 'trying', ask });
    const own = new Worker(new URL('./arrange.worker.ts', import.meta.url), { type: 'module' });
    worker.current = own;
    const finish = (last: Partial<Arranging>) => {
      if (worker.current !== own) return;
      end();
      setArranging((now) => ({ ...now, ...last }));
    };
    own.onmessage = ({ data }: MessageEvent<ArrangeNews>) => {
      if (worker.current !== own) return;
      if (data.kind === 'failed') finish({ state: 'failed' });
      else if (data.kind === 'done') finish({ state: 'done', late: data.late });
      else {
        const { tried, ways, candidate } = data.step;
        setArranging((now) => ({ ...now, tried, ways, candidates: candidate ? ranked([...now.candidates, candidate]) : now.candidates }));
      }
    };
    own.onerror = () => finish({ state: 'failed' });
    own.postMessage(ask);
  }, [end]);

  const stop = useCallback(() => {
    end();
    setArranging((now) => (now.state === 'trying' ? { ...now, state: 'stopped' } : now));
  }, [end]);
  return { arranging, start, stop };
}
