import { queryOptions } from '@tanstack/react-query';
import { developmentApi } from '../../../shared/api/development.api.ts';
import { call } from '../../lib/call.ts';
import { keys } from '../../lib/keys.ts';

/** What the local mail server took in, newest first. */
export const mailboxQuery = queryOptions({
  queryKey: keys.mailbox,
  queryFn: ({ signal }) => call(developmentApi.mailbox, { signal }),
  refetchInterval: 5000,
});

/** One message. */
export const mailQuery = (mailId: string) =>
  queryOptions({ queryKey: keys.mail(mailId), queryFn: ({ signal }) => call(developmentApi.mail, { params: { mailId }, signal }), staleTime: Infinity });
