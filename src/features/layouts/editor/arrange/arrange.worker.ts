import { arrange, type ArrangeStep } from '../../../../../shared/findings/arrange/arrange.ts';
import type { ArrangeAsk } from '../../../../../shared/findings/arrange/ask.ts';

/** What the worker tells: each way tried, then that it has ended, `late` where ways were left untried. */
export type ArrangeNews = { kind: 'step'; step: ArrangeStep } | { kind: 'done'; late: boolean } | { kind: 'failed' };

/** Longest that ways are tried, ms. */
const longestMs = 2500;

const tell = (news: ArrangeNews): void => self.postMessage(news);

// One ask, one worker: whoever wants it stopped ends the worker.
self.onmessage = ({ data }: MessageEvent<ArrangeAsk>) => {
  const until = performance.now() + longestMs;
  let late = false;
  try {
    for (const step of arrange(data, () => (late = performance.now() > until))) tell({ kind: 'step', step });
    tell({ kind: 'done', late });
  } catch (error) {
    console.error(error);
    tell({ kind: 'failed' });
  }
};
