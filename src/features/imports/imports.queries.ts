import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { v7 as uuidv7 } from 'uuid';
import { ImportView, importsApi, type ImportMapping } from '#shared/imports.ts';
import { call, CallProblem, NoReception, problemIn } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';

export const importsQuery = queryOptions({ queryKey: ['imports', 'list'], queryFn: async ({ signal }) => (await call(importsApi.list, { signal })).items });
export const importTargetsQuery = queryOptions({ queryKey: ['imports', 'targets'], queryFn: async ({ signal }) => (await call(importsApi.targets, { signal })).items, staleTime: Infinity });

export function importQuery(importId: string) {
  return queryOptions({ queryKey: ['imports', 'one', importId], queryFn: ({ signal }) => call(importsApi.read, { params: { importId }, signal }) });
}

/** How far a commit has come; asked only while it runs. */
export function importProgressQuery(importId: string, isRunning: boolean) {
  return queryOptions({ queryKey: ['imports', 'progress', importId], queryFn: ({ signal }) => call(importsApi.progress, { params: { importId }, signal }), enabled: isRunning, refetchInterval: 700 });
}

/** Uploads a sheet; nothing is written to the log yet. */
export function useUploadSheet() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async (file: File) => {
      const form = new FormData();
      form.set('id', uuidv7());
      form.set('file', file);
      const response = await fetch(importsApi.upload.path, { method: 'POST', body: form, credentials: 'same-origin' }).catch(() => {
        throw new NoReception();
      });
      if (!response.ok) throw new CallProblem(await problemIn(response));
      return ImportView.parse(await response.json());
    },
    onSuccess: (sheet) => {
      client.setQueryData(importQuery(sheet.id).queryKey, sheet);
      return client.invalidateQueries({ queryKey: importsQuery.queryKey });
    },
  });
}

export function useImportDeed(importId: string, deed: 'check' | 'commit') {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (mapping: ImportMapping) => call(importsApi[deed], { params: { importId }, body: { mapping } }),
    onSuccess: (sheet) => {
      client.setQueryData(importQuery(importId).queryKey, sheet);
      return deed === 'commit' ? invalidateAfter(client, 'imports') : undefined;
    },
  });
}
