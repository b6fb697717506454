import type { LayoutRule } from '../rule.ts';

export const changedSinceSigned: LayoutRule = {
  id: 'changed since signed',
  of: 'layout',
  title: 'Changed since signed',
  source: 'The hash of what was signed differs from that of what stands here',
  check: (scene) =>
    scene.changedSinceSigned
      ? [{ about: 'layout', weight: 'caution', words: 'This layout differs from the revision that the client signed. Send the new revision before you build or hang.', frameIds: [] }]
      : [],
};
