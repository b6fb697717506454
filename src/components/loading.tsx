/** Says that something is on its way. `what` as in "the job book". Shown only once it has taken a moment. */
export function Loading({ what }: { what: string }) {
  return (
    <div role="status" className="appear-late flex items-center gap-3 py-6 text-ink-700">
      <span aria-hidden="true" className="size-5 rounded-full border-2 border-chalk-600 border-r-transparent motion-safe:animate-spin" />
      Fetching {what}…
    </div>
  );
}
