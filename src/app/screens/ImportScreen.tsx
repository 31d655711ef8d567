import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import type { ImportMapping, ImportView } from '#shared/imports.ts';
import { Block, BlockLink } from '#src/components/Block.tsx';
import { ProgressBar } from '#src/components/ProgressBar.tsx';
import { ErrorState, LoadingShape } from '#src/components/states.tsx';
import { ImportReportView } from '#src/features/imports/ImportReportView.tsx';
import { importProgressQuery, importQuery, importTargetsQuery, useImportDeed } from '#src/features/imports/imports.queries.ts';
import { MappingForm } from '#src/features/imports/MappingForm.tsx';
import { formatCount } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

/** One sheet on its way into the log: match, check, write. */
export function Component() {
  const { importId = '' } = useParams();
  const sheet = useQuery(importQuery(importId));
  const targets = useQuery(importTargetsQuery);
  const failed = [sheet, targets].find((query) => query.isError);
  if (failed) return <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />;
  if (!sheet.data || !targets.data) return <LoadingShape says="Fetching the sheet" rows={10} />;
  return <Sheet sheet={sheet.data} targets={targets.data} />;
}

function Sheet({ sheet, targets }: { sheet: ImportView; targets: Parameters<typeof MappingForm>[0]['targets'] }) {
  const [mapping, setMapping] = useState<ImportMapping>(sheet.mapping);
  const check = useImportDeed(sheet.id, 'check');
  const commit = useImportDeed(sheet.id, 'commit');
  const progress = useQuery(importProgressQuery(sheet.id, commit.isPending));
  const isChecked = sheet.report !== null && JSON.stringify(sheet.mapping) === JSON.stringify(mapping);
  const why = sheet.report === null || !isChecked ? 'First check it' : sheet.report.problemCount > 0 ? 'Problems stand in the way' : sheet.report.good === 0 ? 'Nothing new to write' : undefined;
  return (
    <div className="grid grid-cols-1 gap-7">
      <div>
        <h1>{sheet.fileName}</h1>
        <p className="text-row text-ink-2">{formatCount(sheet.rowCount, 'row')}, {sheet.encoding}, {sheet.delimiter} between the cells</p>
      </div>
      {sheet.state === 'committed' ? (
        <div className="grid justify-items-start gap-3">
          <p className="say text-gauge-s"><b className="font-[720]">{formatCount(sheet.batchesMade ?? 0, 'batch is', 'batches are')}</b> in the log.</p>
          <div className="flex flex-wrap gap-2"><BlockLink to={paths.batches} kind="main">Open the log</BlockLink><BlockLink to={paths.causes}>See what goes with what</BlockLink></div>
        </div>
      ) : (
        <>
          <MappingForm sheet={sheet} targets={targets} mapping={mapping} onChange={setMapping} />
          {sheet.report && isChecked && <ImportReportView report={sheet.report} />}
          {check.isError && <ErrorState error={check.error} />}
          {commit.isError && <ErrorState error={commit.error} />}
          {commit.isPending && <ProgressBar done={progress.data?.done ?? 0} of={progress.data?.of ?? sheet.rowCount} label={`${progress.data?.done ?? 0} of ${progress.data?.of ?? sheet.rowCount} batches written; they show when all are`} />}
          <div className="flex flex-wrap gap-2">
            <Block kind={isChecked && !why ? 'plain' : 'main'} busy={check.isPending && 'Checking …'} onClick={() => check.mutate(mapping)}>Check, write nothing</Block>
            <Block kind="main" waitsFor={commit.isPending ? undefined : why} busy={commit.isPending && 'Writing …'} onClick={() => commit.mutate(mapping)}>Write {formatCount(sheet.report?.good ?? 0, 'batch', 'batches')} into the log</Block>
          </div>
        </>
      )}
    </div>
  );
}
