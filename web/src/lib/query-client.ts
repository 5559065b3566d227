import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api-problem';

const mayTryAgain = (failures: number, error: Error): boolean => {
  // An answer is an answer: only a lost connection or a server fault is worth asking again.
  if (error instanceof ApiProblem && error.status !== 0 && error.status < 500) return false;
  return failures < 1;
};

export const createQueryClient = (): QueryClient =>
  new QueryClient({
    defaultOptions: {
      queries: { staleTime: 15_000, retry: mayTryAgain, refetchOnWindowFocus: false, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
