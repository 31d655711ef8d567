import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { CallProblem, NoReception } from './call.ts';
import { saySignedOut } from './signed-out.ts';

/** What else a deed on a feature's records touches; keys are the features' names, first part of every query key. */
const TOUCHES: Record<string, readonly string[]> = {
  batches: ['inspections', 'lots', 'causes', 'methods', 'photos'],
  lots: ['batches', 'causes'],
  materials: ['lots', 'batches'],
  suppliers: ['lots', 'claims'],
  formulas: ['batches', 'causes'],
  inspections: ['batches', 'causes', 'methods', 'lots', 'photos'],
  photos: ['batches', 'inspections'],
  imports: ['batches', 'lots', 'formulas', 'members', 'materials', 'causes', 'methods', 'inspections'],
  members: ['batches', 'session'],
  workshop: ['session', 'batches'],
  claims: [],
};

/** Marks a feature's queries, and those of all that its records touch, as out of date. */
export async function invalidateAfter(client: QueryClient, feature: keyof typeof TOUCHES & string): Promise<void> {
  await Promise.all([feature, ...(TOUCHES[feature] ?? [])].map((key) => client.invalidateQueries({ queryKey: [key] })));
}

/** Trying again helps when nothing answered or the server was busy, never when it said no. */
function isWorthTrying(failures: number, error: unknown): boolean {
  if (failures >= 3) return false;
  return error instanceof NoReception || (error instanceof CallProblem && error.status === 503);
}

function noteRefusal(error: unknown): void {
  if (error instanceof CallProblem && error.status === 401) saySignedOut();
}

export function makeQueryClient(): QueryClient {
  return new QueryClient({
    queryCache: new QueryCache({ onError: noteRefusal }),
    mutationCache: new MutationCache({ onError: noteRefusal }),
    defaultOptions: {
      queries: { staleTime: 15_000, retry: isWorthTrying, retryDelay: (attempt) => Math.min(8_000, 600 * 2 ** attempt) * (0.7 + Math.random() * 0.6), refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
}
