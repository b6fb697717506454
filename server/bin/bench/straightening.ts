import { howExact } from './straightening/how-exact.ts';
import { howFast } from './straightening/how-fast.ts';

/**
 * How exact and how fast a photo becomes an elevation. Goals: with four marks a worst error of at most 1.1 times OpenCV's; with
 * straight edges marked at least three times better on the barrel scene; at most 1.5 times ImageMagick's time for the same work;
 * the event loop never held up over 50 ms.
 */
export async function run(): Promise<string[]> {
  return [...(await howExact()), ...(await howFast())];
}
