import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { inspectionsApi, type FindingView, type InspectionView, type NewFinding } from '#shared/inspections.ts';
import type { Answer } from '#shared/words/fault-words.ts';
import type { Stage } from '#shared/words/stages.ts';
import { useToasts } from '#src/components/Toasts.tsx';
import { call } from '#src/lib/call.ts';
import { invalidateAfter } from '#src/lib/query-client.ts';
import { inspectionsOfBatchQuery, putInspection } from './inspections.queries.ts';

/** Everything that changes a look; each shows at once and is sent in order. */
export interface Look {
  inspection: InspectionView | undefined;
  /** Findings that stand, those on their way included. */
  findings: (FindingView | (NewFinding & { isOnItsWay: true }))[];
  answerOf(fault: string): Answer;
  answer(faults: readonly string[], answer: Answer): void;
  keep(finding: NewFinding): Promise<boolean>;
  takeBack(findingId: string): void;
  isSending: boolean;
}

/** The look at a batch at a stage: the one begun already, or a new one that begins with the first answer. */
export function useLook(batchId: string, stage: Stage): Look {
  const client = useQueryClient();
  const toasts = useToasts();
  const { data: inspections } = useSuspenseQuery(inspectionsOfBatchQuery(batchId));
  const inspection = inspections.filter((look) => look.stage === stage).at(-1);
  const ownId = useRef(new Map<Stage, string>());
  const queue = useRef<Promise<unknown>>(Promise.resolve());
  const [pendingAnswers, setPendingAnswers] = useState<ReadonlyMap<string, Answer>>(new Map());
  const [onTheirWay, setOnTheirWay] = useState<NewFinding[]>([]);
  const [sending, setSending] = useState(0);

  /** The look as the server has it now; made when nobody has looked yet. */
  const begun = useCallback(async (): Promise<InspectionView> => {
    const known = client.getQueryData(inspectionsOfBatchQuery(batchId).queryKey)?.filter((look) => look.stage === stage).at(-1);
    if (known) return known;
    const id = ownId.current.get(stage) ?? uuidv7();
    ownId.current.set(stage, id);
    const made = await call(inspectionsApi.record, { params: { batchId }, body: { id, stage, inspectedAt: new Date().toISOString() } });
    putInspection(client, made);
    return made;
  }, [batchId, client, stage]);

  /** One deed after the other, so that our own quick touches never meet a stale version. */
  const send = useCallback((deed: (look: InspectionView) => Promise<void>): Promise<boolean> => {
    setSending((count) => count + 1);
    const sent = queue.current.then(async () => {
      try {
        await deed(await begun());
        return true;
      } catch (error) {
        toasts.tell(error instanceof Error ? error.message : 'This could not be kept');
        await client.invalidateQueries({ queryKey: inspectionsOfBatchQuery(batchId).queryKey });
        return false;
      } finally {
        setSending((count) => count - 1);
      }
    });
    queue.current = sent;
    return sent;
  }, [batchId, begun, client, toasts]);

  const refresh = async (id: string) => {
    putInspection(client, await call(inspectionsApi.read, { params: { inspectionId: id } }));
    void invalidateAfter(client, 'batches');
  };

  const answer = (faults: readonly string[], given: Answer) => {
    setPendingAnswers((pending) => new Map([...pending, ...faults.map((fault) => [fault, given] as const)]));
    void send(async (look) => {
      putInspection(client, await call(inspectionsApi.change, { params: { inspectionId: look.id }, body: { answers: faults.map((fault) => ({ fault, answer: given })) }, version: look.version }));
      void invalidateAfter(client, 'batches');
    }).then(() => setPendingAnswers((pending) => new Map([...pending].filter(([fault]) => !faults.includes(fault)))));
  };

  const keep = async (finding: NewFinding): Promise<boolean> => {
    setOnTheirWay((list) => [...list, finding]);
    const isKept = await send(async (look) => {
      await call(inspectionsApi.keepFinding, { params: { inspectionId: look.id }, body: finding });
      await refresh(look.id);
    });
    setOnTheirWay((list) => list.filter(({ id }) => id !== finding.id));
    return isKept;
  };

  const takeBack = (findingId: string) => {
    void send(async (look) => {
      const finding = look.findings.find(({ id }) => id === findingId);
      if (!finding) return;
      await call(inspectionsApi.withdrawFinding, { params: { findingId }, body: { isWithdrawn: true }, version: finding.version });
      await refresh(look.id);
    });
  };

  const standing = (inspection?.findings ?? []).filter(({ isWithdrawn }) => !isWithdrawn);
  const arriving = onTheirWay.filter(({ id }) => !standing.some((finding) => finding.id === id)).map((finding) => ({ ...finding, isOnItsWay: true as const }));
  return {
    inspection,
    findings: [...standing, ...arriving],
    answerOf: (fault) => pendingAnswers.get(fault) ?? (arriving.some((finding) => finding.fault === fault) ? 'found' : (inspection?.answers.find((given) => given.fault === fault)?.answer ?? 'not-checked')),
    answer, keep, takeBack,
    isSending: sending > 0,
  };
}
