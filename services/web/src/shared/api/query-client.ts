import { QueryClient } from '@tanstack/react-query';
import { ApiProblem, ContractError } from './problem.js';
import { getSession, subscribeSession } from './session.js';

/** Server state of the page. Another person at the same machine never sees what the last one loaded. */
export function createQueryClient(): QueryClient {
  const client = new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        retry: (failures, error) =>
          failures < 2 &&
          !(error instanceof ContractError) &&
          !(error instanceof ApiProblem && error.status < 500),
      },
      mutations: { retry: false },
    },
  });
  let userId = currentUserId();
  subscribeSession(() => {
    const now = currentUserId();
    if (now === userId) return;
    userId = now;
    client.clear();
  });
  return client;
}

function currentUserId(): string | null {
  const session = getSession();
  return session.status === 'signedIn' ? `${session.me.workspace.id}/${session.me.user.id}` : null;
}
