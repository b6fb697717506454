import { Toaster as Parts } from 'sonner';

/** Where short news of things done appears, read out politely. What must be acted on stands in the page instead. */
export function Toaster() {
  return (
    <Parts
      position="bottom-right"
      duration={5000}
      style={{ fontFamily: 'inherit' }}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast: 'flex w-full items-start gap-3 border border-ink-700 border-l-4 bg-white px-4 py-3 text-ink-900 shadow-md',
          title: 'font-semibold',
          description: 'text-sm text-ink-700',
          success: 'border-l-sage-600',
          error: 'border-l-madder-600',
          actionButton: 'min-h-8 font-semibold text-chalk-600 underline',
        },
      }}
    />
  );
}
