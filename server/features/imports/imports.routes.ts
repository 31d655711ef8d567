import express, { type RequestHandler } from 'express';
import multer from 'multer';
import { z } from 'zod';
import { IMPORT_LIMITS, importsApi } from '#shared/imports.ts';
import type { Api } from '#server/http/api.ts';
import { invalidField } from '#server/problem.ts';
import { listImports, readImport, readProgress } from './imports.read.ts';
import { checkImport, commitImport, uploadSheet } from './imports.service.ts';
import { importTargets } from './propose-mapping.ts';

const takeForm = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: IMPORT_LIMITS.bytes, files: 1, fields: 4, parts: 6, fieldSize: 1024, fieldNameSize: 100, headerPairs: 50, fieldNestingDepth: 0, fieldArrayIndexLimit: 0 } as multer.Options['limits'],
}).single('file');
const takeText = express.raw({ type: ['text/csv', 'text/plain', 'application/csv'], limit: IMPORT_LIMITS.bytes });
/** A form from the screen, or the sheet itself as `text/csv`. */
const takeSheet: RequestHandler = (request, response, next) => (request.is('multipart/form-data') ? takeForm : takeText)(request, response, next);

const FormFields = z.object({ id: z.uuidv7({ error: 'id must be a UUID of version 7' }).optional(), fileName: z.string().max(200).optional() });

export function importsRoutes(api: Api): void {
  api.upload(importsApi.upload, takeSheet, ({ request, query, work }) => {
    const fields = FormFields.parse({ ...(request.body instanceof Buffer ? {} : { ...request.body }), ...query });
    const bytes = request.file?.buffer ?? (request.body instanceof Buffer ? request.body : undefined);
    if (!bytes) throw invalidField('#/file', 'Send one CSV file in the field named file');
    const fileName = (fields.fileName ?? request.file?.originalname ?? 'batch history.csv').replaceAll(/\p{Cc}/gu, '').slice(0, 200);
    return uploadSheet(work, { ...(fields.id === undefined ? {} : { id: fields.id }), fileName, bytes });
  });
  api.serve(importsApi.list, ({ tx }) => listImports(tx));
  api.serve(importsApi.targets, () => Promise.resolve({ items: importTargets() }));
  api.serve(importsApi.read, ({ tx, params }) => readImport(tx, params.importId));
  api.serve(importsApi.check, ({ tx, params, body }) => checkImport(tx, params.importId, body.mapping));
  api.steps(importsApi.commit, ({ work, aside, params, body }) => commitImport(work, aside, params.importId, body.mapping));
  api.serve(importsApi.progress, ({ tx, params }) => readProgress(tx, params.importId));
}
