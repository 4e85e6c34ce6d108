import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api';

const TRIES = 2;

/** A refusal is an answer; only a silence or a fault of the server is asked again. */
export const worthRetrying = (failures: number, fault: unknown): boolean =>
  failures < TRIES && (!(fault instanceof ApiProblem) || fault.offline || fault.status >= 500);

const make = () =>
  new QueryClient({
    defaultOptions: { queries: { staleTime: 30_000, retry: worthRetrying, refetchOnWindowFocus: true }, mutations: { retry: false } },
  });

let client: QueryClient | null = null;

/** One client for all islands of a page in the browser; a fresh one for each rendering on the server. */
export function queryClient(): QueryClient {
  if (typeof window === 'undefined') return make();
  return (client ??= make());
}
