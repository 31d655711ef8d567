import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { v7 as uuidv7 } from 'uuid';
import type { BatchView } from '#shared/batches.ts';
import { BatchView as BatchViewSchema } from '#shared/batches.ts';
import { BlockLink } from '#src/components/Block.tsx';
import { ErrorState, LoadingShape, NotAllowed } from '#src/components/states.tsx';
import { useToasts } from '#src/components/Toasts.tsx';
import { changeBetween, draftOf, duplicateOf, emptyDraft, meet, type BatchDraft, type Meeting } from '#src/features/batches/batch-draft.ts';
import { BatchForm } from '#src/features/batches/BatchForm.tsx';
import { batchQuery, useChangeBatch, useLogBatch } from '#src/features/batches/batches.queries.ts';
import { StaleNotice } from '#src/features/batches/StaleNotice.tsx';
import { useMay, useSession } from '#src/features/session/session.queries.ts';
import { CallProblem } from '#src/lib/call.ts';
import { todayIn } from '#src/lib/format.ts';
import { paths } from '../paths.ts';

/** Log a batch, or change one that is logged: `/batches/new`, `/batches/new?from=…`, `/batches/:batchId/change`. */
export function Component() {
  const { batchId } = useParams();
  const [search] = useSearchParams();
  const from = search.get('from');
  const may = useMay();
  const id = batchId ?? from;
  const source = useQuery({ ...batchQuery(id ?? ''), enabled: id !== null, refetchOnWindowFocus: false });
  const batch = source.data;
  const title = batchId ? `Change ${batch?.code ?? 'a batch'}` : from ? `Like ${batch?.code ?? 'another'}` : 'Log a batch';
  return (
    <>
      <title>{`${title} – Loafmark`}</title>
      <h1 className="mb-5">{title}</h1>
      {!may('batch.write') ? (
        <NotAllowed>Only an owner or a maker logs and changes batches.</NotAllowed>
      ) : id === null ? (
        <NewBatchForm key="blank" />
      ) : source.isPending ? (
        <LoadingShape says="Reading the batch" rows={8} rowClassName="h-16" />
      ) : source.isError ? (
        <ErrorState error={source.error} onRetry={() => void source.refetch()} />
      ) : batch && batch.seesQuantities ? (
        batchId ? <ChangeForm key={batch.id} first={batch} /> : <NewBatchForm key={batch.id} like={batch} />
      ) : (
        <NotAllowed>Only those who may read formulas can change a batch.</NotAllowed>
      )}
    </>
  );
}

function NewBatchForm({ like }: { like?: BatchView }) {
  const { workshop, member } = useSession();
  const navigate = useNavigate();
  const { tell } = useToasts();
  const logBatch = useLogBatch();
  // Made once: sending the same form again after lost reception logs no second batch.
  const [start] = useState<BatchDraft>(() => {
    const today = todayIn(workshop.timeZone);
    if (like) return duplicateOf(like, uuidv7(), today);
    return { ...emptyDraft(uuidv7(), today), makerId: member.id };
  });
  return (
    <BatchForm
      start={start} stateNow={null} saveWords="Keep this batch" busyWords="Keeping …"
      away={<BlockLink kind="quiet" to={like ? paths.batch(like.id) : paths.batches}>Leave it</BlockLink>}
      onSave={async (draft) => {
        const batch = await logBatch.mutateAsync(draft);
        tell(`${batch.code} is in the log`);
        await navigate(paths.batch(batch.id), { replace: true });
      }}
    />
  );
}

interface Stale {
  meeting: Meeting;
  mine: BatchDraft;
  current: BatchView;
}

function ChangeForm({ first }: { first: BatchView }) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const { tell } = useToasts();
  const { account } = useSession();
  const changeBatch = useChangeBatch(first.id);
  const [known, setKnown] = useState(first);
  const [stale, setStale] = useState<Stale>();
  const [incoming, setIncoming] = useState<Partial<BatchDraft>>();
  const [start] = useState(() => draftOf(first));

  const save = async (draft: BatchDraft) => {
    const change = changeBetween(draftOf(known), draft);
    if (Object.keys(change).length > 0) {
      try {
        await changeBatch.mutateAsync({ change, version: known.version });
      } catch (error) {
        const current = error instanceof CallProblem && error.status === 412 ? BatchViewSchema.safeParse(error.problem.current).data : undefined;
        if (!current) throw error;
        const meeting = meet(draftOf(known), draft, draftOf(current));
        client.setQueryData(batchQuery(first.id).queryKey, current);
        setKnown(current);
        setIncoming(meeting.theirs as Partial<BatchDraft>);
        setStale({ meeting, mine: draft, current });
        return;
      }
      tell(`${first.code} is changed`);
    }
    await navigate(paths.batch(first.id), { replace: true });
  };
  const takeTheirs = (field: Meeting['both'][number]) => {
    if (!stale) return;
    setIncoming({ [field]: draftOf(stale.current)[field] });
    setStale({ ...stale, meeting: { ...stale.meeting, both: stale.meeting.both.filter((one) => one !== field) } });
  };
  return (
    <BatchForm
      start={start} stateNow={known.state} saveWords="Keep the changes" busyWords="Keeping …" onSave={save} {...(incoming ? { incoming } : {})}
      notice={stale && <StaleNotice {...stale} units={account} onTakeTheirs={takeTheirs} />}
      away={<BlockLink kind="quiet" to={paths.batch(first.id)}>Leave it as it was</BlockLink>}
    />
  );
}
