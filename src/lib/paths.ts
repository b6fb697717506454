/** Every address of a page. Route patterns for the router, functions for links. */
export const routePatterns = {
  jobs: '/jobs',
  job: '/jobs/:jobId',
  measure: '/jobs/:jobId/walls/:wallId',
  layout: '/jobs/:jobId/layouts/:layoutId',
  patterns: '/patterns',
  hardware: '/hardware',
  team: '/team',
  signIn: '/sign-in',
  register: '/register',
  portal: '/p/:token',
  mailbox: '/dev/mailbox',
} as const;

export const paths = {
  home: '/',
  jobs: '/jobs',
  job: (jobId: string) => `/jobs/${jobId}`,
  measure: (jobId: string, wallId: string) => `/jobs/${jobId}/walls/${wallId}`,
  layout: (jobId: string, layoutId: string) => `/jobs/${jobId}/layouts/${layoutId}`,
  patterns: '/patterns',
  hardware: '/hardware',
  team: '/team',
  /** `back`: where to go once signed in; only addresses of ours, beginning with one slash. */
  signIn: (back?: string) => (back && back !== '/' ? `/sign-in?back=${encodeURIComponent(back)}` : '/sign-in'),
  register: '/register',
  portal: (token: string) => `/p/${token}`,
  mailbox: '/dev/mailbox',
};

/** The address to return to after signing in, or the job book where none of ours is given. */
export function safeBack(back: string | null): string {
  return back && /^\/(?![/\\])/.test(back) ? back : paths.jobs;
}
