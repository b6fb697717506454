/**
 * The names of what the query cache holds, so that one feature can mark stale what another shows.
 * Marking `keys.job(id)` marks all that hangs on that job: its walls, layouts and links.
 */
export const keys = {
  health: ['health'] as const,
  me: ['people', 'me'] as const,
  members: ['people', 'members'] as const,
  jobs: ['jobs'] as const,
  job: (jobId: string) => ['jobs', jobId] as const,
  wallsOf: (jobId: string) => ['jobs', jobId, 'walls'] as const,
  layoutsOf: (jobId: string) => ['jobs', jobId, 'layouts'] as const,
  linksOf: (jobId: string) => ['jobs', jobId, 'links'] as const,
  wall: (wallId: string) => ['walls', wallId] as const,
  photosOf: (wallId: string) => ['walls', wallId, 'photos'] as const,
  photoProgress: (photoId: string) => ['photo-progress', photoId] as const,
  layout: (layoutId: string) => ['layouts', layoutId] as const,
  layoutVersion: (layoutId: string) => ['layout-versions', layoutId] as const,
  revision: (revisionId: string) => ['revisions', revisionId] as const,
  patterns: ['patterns'] as const,
  hardware: ['hardware'] as const,
  printers: ['printers'] as const,
  templatePlan: (layoutId: string) => ['template-plans', layoutId] as const,
  portal: (token: string) => ['portal', token] as const,
  mailbox: ['development', 'mailbox'] as const,
  mail: (mailId: string) => ['development', 'mailbox', mailId] as const,
};
