import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './call-api.ts';

let shared: QueryClient | undefined;

/** The one query client of a page, shared by its islands. Only ever made in the browser. */
export function queryClient(): QueryClient {
  shared ??= new QueryClient({
    defaultOptions: {
      queries: { staleTime: 10_000, retry: (failures, error) => failures < 3 && mayPass(error) },
      mutations: { retry: (failures, error) => failures < 3 && mayPass(error) },
    },
  });
  return shared;
}

/** Whether asking again may help: the server was out of reach or out of order. */
function mayPass(error: Error): boolean {
  return error instanceof ApiError && (error.status === 0 || error.status >= 502);
}
